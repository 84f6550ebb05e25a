export const root: string;
export const dataFolder: string;
export const buildFolder: string;
export const webFolder: string;
export const registerCluster: string;
export const testCluster: string;
export const lockFolder: string;

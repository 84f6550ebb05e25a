/** Bundles the server and the local services into a folder of this checkout; answers the two files. */
export function bundleServer(folder?: string): Promise<{ server: string; fakes: string }>;

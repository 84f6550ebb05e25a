export interface OpenCluster {
  adminUrl: string;
  place: string;
  state: 'running' | 'started' | 'made and started';
  close(): Promise<void>;
}
export function openCluster(options: { home: string; disposable?: boolean }): Promise<OpenCluster>;
export function freePort(): Promise<number>;
export function databaseUrl(adminUrl: string, name: string): string;
export function ensureDatabase(url: string): Promise<boolean>;

/** The part of yazl that is used; the package brings no types of its own. */
declare module 'yazl' {
  interface EntryOptions {
    mtime?: Date;
    mode?: number;
    compress?: boolean;
    /** Writes the DOS time alone, without the extended timestamp in UTC. */
    forceDosTimestamp?: boolean;
    size?: number;
  }
  export class ZipFile {
    readonly outputStream: NodeJS.ReadableStream;
    addReadStreamLazy(metadataPath: string, options: EntryOptions, getReadStream: (give: (error: unknown, stream: NodeJS.ReadableStream) => void) => void): void;
    end(): void;
  }
  const yazl: { ZipFile: typeof ZipFile };
  export default yazl;
}

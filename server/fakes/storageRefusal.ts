/** A refusal as object storage answers it: an XML code and a status. */
export class StorageRefusal extends Error {
  readonly code: string;
  readonly status: number;
  constructor(code: string, status: number, message: string) {
    super(message);
    this.code = code;
    this.status = status;
  }
}

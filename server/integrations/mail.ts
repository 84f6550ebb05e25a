import { Resend } from 'resend';
import { z } from 'zod';

export interface OutgoingMail {
  to: string;
  subject: string;
  text: string;
  /** Sending again with the same key within 24 hours sends nothing and answers the first id. */
  idempotencyKey: string;
}

export interface SentMail {
  id: string;
  to: string[];
  subject: string;
  /** ISO 8601. */
  sentAt: string;
  text: string;
}

export interface Mailer {
  send(mail: OutgoingMail): Promise<{ id: string }>;
  /** The newest messages first, with their text; `limit` from 1 to 100. */
  listSent(limit: number): Promise<SentMail[]>;
}

/** The mail API refused or could not be reached. `retriable` is false when sending again cannot help. */
export class MailError extends Error {
  readonly code: string;
  readonly status: number | null;
  readonly retriable: boolean;
  constructor(code: string, status: number | null, message: string) {
    super(message);
    this.name = 'MailError';
    this.code = code;
    this.status = status;
    this.retriable = status === null || status === 429 || status >= 500 || code === 'concurrent_idempotent_requests';
  }
}

interface Answer<T> {
  data: T | null;
  error: { name: string; message: string; statusCode: number | null } | null;
}

function unwrap<T>({ data, error }: Answer<T>): T {
  if (error !== null) throw new MailError(error.name, error.statusCode, error.message);
  if (data === null) throw new MailError('empty_answer', null, 'The mail API answered nothing.');
  return data;
}

const addresses = z.union([z.string().transform((one) => [one]), z.array(z.string())]);

/** Mail by Resend's client; another service with its API, or the local stand-in, by another `apiUrl`. */
export function connectMailer(settings: { apiUrl: string; apiKey: string; from: string }): Mailer {
  const resend = new Resend(settings.apiKey, { baseUrl: settings.apiUrl });
  return {
    async send({ to, subject, text, idempotencyKey }) {
      const { id } = unwrap(await resend.emails.send({ from: settings.from, to, subject, text }, { idempotencyKey }));
      return { id };
    },
    async listSent(limit) {
      const { data } = unwrap(await resend.emails.list({ limit }));
      return await Promise.all(
        data.map(async ({ id }) => {
          const message = unwrap(await resend.emails.get(id));
          return { id, to: addresses.parse(message.to), subject: message.subject, sentAt: message.created_at, text: message.text ?? '' };
        }),
      );
    },
  };
}

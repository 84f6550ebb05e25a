import { createHash, randomUUID, timingSafeEqual } from 'node:crypto';
import { mkdir, readFile, readdir } from 'node:fs/promises';
import { join } from 'node:path';
import express from 'express';
import type { Express, Request, Response } from 'express';
import { z } from 'zod';
import { writeDurably } from './durableFile';

/**
 * A local stand-in for Resend's mail API: the paths the register uses, with its refusals
 * (401, 403, 409, 422) and its idempotency keys, which hold for 24 hours. What is sent is kept in a
 * folder, one file a message, before it is answered.
 */

export interface MailFakeOptions {
  folder: string;
  apiKey: string;
  now?: () => Date;
}

const oneOrMany = z.union([z.string(), z.array(z.string()).min(1).max(50)]);
const messageSchema = z.object({ from: z.string(), to: oneOrMany, subject: z.string(), text: z.string().optional(), html: z.string().optional(), cc: oneOrMany.optional(), bcc: oneOrMany.optional(), reply_to: oneOrMany.optional() });
const keptSchema = messageSchema.extend({ id: z.string(), created_at: z.string(), idempotencyKey: z.string().nullable(), bodyHash: z.string(), sequence: z.number() });
type KeptMessage = z.infer<typeof keptSchema>;

const dayMs = 24 * 60 * 60 * 1000;
const address = /^(?:[^<>]*<)?[^\s<>@]+@[^\s<>@]+\.[^\s<>@]+>?$/;
const asList = (value: string | string[] | undefined) => (value === undefined ? [] : Array.isArray(value) ? value : [value]);

function refuse(response: Response, statusCode: number, name: string, message: string): void {
  response.status(statusCode).json({ statusCode, name, message });
}

function sameText(a: string, b: string): boolean {
  const [left, right] = [a, b].map((text) => createHash('sha256').update(text).digest());
  return left !== undefined && right !== undefined && timingSafeEqual(left, right);
}

/** The first thing wrong with a message, as the API words it, or undefined. */
function problemOf(body: unknown): { name: string; message: string } | undefined {
  const parsed = messageSchema.safeParse(body);
  if (!parsed.success) {
    const field = String(parsed.error.issues[0]?.path[0] ?? 'body');
    const missing = typeof body !== 'object' || body === null || !(field in body);
    return missing ? { name: 'missing_required_field', message: `Missing \`${field}\` field.` } : { name: 'validation_error', message: `Invalid \`${field}\` field.` };
  }
  const { from, to, text, html } = parsed.data;
  if (!address.test(from)) return { name: 'invalid_from_address', message: 'Invalid `from` field. The email address needs to follow the `email@example.com` or `Name <email@example.com>` format.' };
  if (!asList(to).every((recipient) => address.test(recipient))) return { name: 'validation_error', message: 'Invalid `to` field. The email address needs to follow the `email@example.com` or `Name <email@example.com>` format.' };
  if (text === undefined && html === undefined) return { name: 'missing_required_field', message: 'Missing `html` or `text` field.' };
  return undefined;
}

async function readKept(folder: string): Promise<KeptMessage[]> {
  await mkdir(folder, { recursive: true });
  const names = (await readdir(folder)).filter((name) => name.endsWith('.json'));
  const kept = await Promise.all(names.map(async (name) => keptSchema.parse(JSON.parse(await readFile(join(folder, name), 'utf8')))));
  return kept.sort((a, b) => a.sequence - b.sequence);
}

function summary(message: KeptMessage) {
  return { id: message.id, to: asList(message.to), from: message.from, created_at: message.created_at, subject: message.subject, cc: asList(message.cc), bcc: asList(message.bcc), reply_to: asList(message.reply_to), last_event: 'delivered', scheduled_at: null };
}

function listPage(kept: KeptMessage[], request: Request) {
  const newestFirst = [...kept].reverse();
  const limit = Math.min(Math.max(Number(request.query['limit'] ?? 20) || 20, 1), 100);
  const after = newestFirst.findIndex((message) => message.id === request.query['after']);
  const page = newestFirst.slice(after + 1, after + 1 + limit);
  return { object: 'list', has_more: after + 1 + limit < newestFirst.length, data: page.map(summary) };
}

export async function buildMailFake({ folder, apiKey, now = () => new Date() }: MailFakeOptions): Promise<Express> {
  const kept = await readKept(folder);
  // One request at a time: two that carry one idempotency key must not both find it unused.
  let turn: Promise<unknown> = Promise.resolve();

  async function accept(request: Request, response: Response): Promise<void> {
    const problem = problemOf(request.body);
    if (problem !== undefined) return refuse(response, 422, problem.name, problem.message);
    const idempotencyKey = request.get('idempotency-key') ?? null;
    if (idempotencyKey !== null && (idempotencyKey.length < 1 || idempotencyKey.length > 256)) return refuse(response, 400, 'invalid_idempotency_key', 'The idempotency key must be between 1-256 chars.');
    const bodyHash = createHash('sha256').update(JSON.stringify(request.body)).digest('hex');
    const earlier = idempotencyKey === null ? undefined : kept.find((message) => message.idempotencyKey === idempotencyKey && now().getTime() - Date.parse(message.created_at) < dayMs);
    if (earlier !== undefined) {
      if (earlier.bodyHash !== bodyHash) return refuse(response, 409, 'invalid_idempotent_request', 'Same idempotency key used with a different request payload.');
      response.json({ id: earlier.id });
      return;
    }
    const sequence = (kept.at(-1)?.sequence ?? 0) + 1;
    const message: KeptMessage = { ...messageSchema.parse(request.body), id: randomUUID(), created_at: now().toISOString(), idempotencyKey, bodyHash, sequence };
    await writeDurably(join(folder, `${String(sequence).padStart(8, '0')}.json`), JSON.stringify(message));
    kept.push(message);
    response.json({ id: message.id });
  }

  const app = express();
  app.disable('x-powered-by');
  app.use((request, response, next) => {
    const authorization = request.get('authorization');
    if (authorization === undefined) return refuse(response, 401, 'missing_api_key', 'Missing API Key');
    if (!sameText(authorization, `Bearer ${apiKey}`)) return refuse(response, 403, 'invalid_api_key', 'API key is invalid');
    next();
  });
  app.use(express.json({ limit: '1mb' }));
  app.post('/emails', async (request, response) => {
    const mine = turn.then(() => accept(request, response));
    turn = mine.catch(() => undefined);
    await mine;
  });
  app.get('/emails', (request, response) => void response.json(listPage(kept, request)));
  app.get('/emails/:id', (request, response) => {
    const message = kept.find(({ id }) => id === request.params.id);
    if (message === undefined) return refuse(response, 404, 'not_found', 'Email not found');
    response.json({ object: 'email', ...summary(message), text: message.text ?? null, html: message.html ?? null });
  });
  app.use((_request, response) => refuse(response, 404, 'not_found', 'The requested endpoint does not exist'));
  return app;
}

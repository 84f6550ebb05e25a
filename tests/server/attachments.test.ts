import { createHash } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Problem } from '../../shared/contracts/problems';
import type { AttachmentView, SubmissionDetail } from '../../shared/contracts/submissions';
import type { TestClient } from '../support/client';
import { csv, hiddenPlace, jpegImageData, jpegWithPlace, linuxProgram, pdf, pngImageData, pngWithPlace, tiffWithPlace, windowsProgram } from '../support/evidenceFiles';
import { makePerson } from '../support/factories';
import { soundSpecimen, wholeChecklist } from '../support/submissionContent';
import { startTestApp, type TestApp } from '../support/testApp';

let app: TestApp;
let contributor: TestClient;
let reviewer: TestClient;
let draftId: string;

const sha256 = (bytes: Buffer) => createHash('sha256').update(bytes).digest('hex');

function form(bytes: Buffer, name: string, fields: Record<string, string> = {}): FormData {
  const data = new FormData();
  for (const [key, value] of Object.entries(fields)) data.append(key, value);
  data.append('file', new Blob([new Uint8Array(bytes)]), name);
  return data;
}
const upload = (bytes: Buffer, name: string, fields: Record<string, string> = {}, client = contributor, id = draftId) => client.post<AttachmentView & Pick<Problem, 'code'>>(`/submissions/${id}/attachments`, form(bytes, name, fields));
const newDraft = async (code: string) => (await contributor.post<SubmissionDetail>('/submissions', { kind: 'specimen', content: soundSpecimen(code) })).body.id;

beforeAll(async () => {
  app = await startTestApp({ seed: 'vocabularies' });
  contributor = await app.as('contributor');
  reviewer = await app.as('reviewer');
  draftId = await newDraft('ATT-1');
});
afterAll(() => app.close());

describe('a file of evidence', () => {
  it.each([
    ['scan.pdf', pdf, 'application/pdf'],
    ['counts.csv', csv, 'text/csv'],
    ['section.png', pngWithPlace(), 'image/png'],
    ['section.jpg', jpegWithPlace(), 'image/jpeg'],
    ['section.tif', tiffWithPlace(), 'image/tiff'],
  ])('is taken by its content: %s', async (name, bytes, mediaType) => {
    const answer = await upload(bytes, name, { fieldPath: 'structures.0', caption: ' A page of the notebook ' });
    expect(answer).toMatchObject({ status: 201, body: { name, mediaType, fieldPath: 'structures.0', caption: 'A page of the notebook', uploadedBy: 'Test contributor' } });
    const stored = await contributor.get(`/submissions/${draftId}/attachments/${answer.body.id}`);
    expect(stored.status).toBe(200);
    expect(sha256(stored.bytes)).toBe(answer.body.sha256);
    expect(stored.bytes.length).toBe(answer.body.bytes);
    expect(stored.headers.get('content-type')).toBe(mediaType);
    expect(stored.headers.get('content-disposition')).toBe(`attachment; filename="${name}"; filename*=UTF-8''${name}`);
    expect(stored.headers.get('x-content-type-options')).toBe('nosniff');
  });

  it.each([
    ['program.pdf', windowsProgram],
    ['program.png', linuxProgram],
    ['script.csv', Buffer.from('#!/bin/sh\necho a,b\n')],
    ['page.csv', Buffer.from('<html><script>alert(1)</script>,1\n,2\n')],
    ['drawing.png', Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"></svg>')],
    ['words.csv', Buffer.from('one column\nof words\n')],
    ['latin.csv', Buffer.from('a,b\n\xe9,2\n', 'latin1')],
    ['archive.csv', Buffer.from('PK\x03\x04\x14\0\0\0', 'latin1')],
    ['animation.jpg', Buffer.from('GIF89a\x01\0\x01\0\0\0\0;', 'latin1')],
    ['cut.jpg', jpegWithPlace().subarray(0, 150)],
    ['cut.png', pngWithPlace().subarray(0, 60)],
    ['empty.csv', Buffer.alloc(0)],
  ])('is refused when it is something else under a harmless name: %s', async (name, bytes) => {
    expect(await upload(bytes, name)).toMatchObject({ status: 415, body: { code: 'unsupported-type' } });
  });

  it('is stored under a plain name whatever it was called', async () => {
    const named = async (name: string, bytes = pdf) => (await upload(bytes, name)).body.name;
    expect(await named('../../etc/passwd.pdf')).toBe('passwd.pdf');
    expect(await named('C:\\Users\\me\\scan.pdf')).toBe('scan.pdf');
    expect(await named('.htaccess')).toBe('htaccess.pdf');
    expect(await named('photo.exe', csv)).toBe('photo.exe.csv');
    expect(await named('gnp.\u202eexe.pdf')).toBe('gnp.exe.pdf');
    expect(await named('Ärztin "1".pdf')).toBe('Ärztin _1_.pdf');
    expect((await named(`${'n'.repeat(300)}.pdf`)).length).toBe(120);
  });

  it('of a name outside ASCII is saved under it by its header alone', async () => {
    const { body } = await upload(csv, 'Zählung 1.csv');
    const { headers } = await contributor.get(`/submissions/${draftId}/attachments/${body.id}`);
    expect(headers.get('content-disposition')).toBe(`attachment; filename="Z_hlung 1.csv"; filename*=UTF-8''Z%C3%A4hlung%201.csv`);
  });

  it('of more than 25 MB is refused, and one of exactly 25 MB taken', async () => {
    const padded = (bytes: number) => Buffer.concat([pdf, Buffer.alloc(bytes - pdf.length, 0x20)]);
    expect((await upload(padded(25 * 1024 * 1024), 'large.pdf')).status).toBe(201);
    expect(await upload(padded(25 * 1024 * 1024 + 1), 'larger.pdf')).toMatchObject({ status: 413, body: { code: 'too-large' } });
  });

  it('comes as one file in a form that can be read', async () => {
    const two = form(pdf, 'a.pdf');
    two.append('file', new Blob([new Uint8Array(pdf)]), 'b.pdf');
    expect((await contributor.post(`/submissions/${draftId}/attachments`, two)).status).toBe(400);
    expect((await contributor.post(`/submissions/${draftId}/attachments`, { file: 'x' })).status).toBe(400);
    const broken = await contributor.post(`/submissions/${draftId}/attachments`, '--x\r\nContent-Disposition: form-data; name="file"; filename="a.pdf"\r\n\r\n%PDF', { headers: { 'content-type': 'multipart/form-data; boundary=x' } });
    expect(broken.status).toBe(400);
  });
});

describe('location data', () => {
  const stored = async (bytes: Buffer, name: string) => {
    const { body } = await upload(bytes, name);
    return (await app.context.storage.get(`attachments/${body.sha256}`))?.content ?? Buffer.alloc(0);
  };

  it('leave a JPEG before it is stored, the image data staying byte for byte', async () => {
    expect(jpegWithPlace().includes(hiddenPlace)).toBe(true);
    const kept = await stored(jpegWithPlace(), 'phone.jpg');
    expect(kept.includes(hiddenPlace)).toBe(false);
    expect(kept.includes('Exif')).toBe(false);
    expect(kept.includes(jpegImageData)).toBe(true);
    expect(kept.includes('ICC_PROFILE')).toBe(true);
    expect([...kept.subarray(0, 4)]).toEqual([0xff, 0xd8, 0xff, 0xe0]);
    expect([...kept.subarray(-2)]).toEqual([0xff, 0xd9]);
  });

  it('leave a turned JPEG, which stays turned', async () => {
    const kept = await stored(jpegWithPlace(6), 'turned.jpg');
    expect(kept.includes(hiddenPlace)).toBe(false);
    const exif = kept.indexOf('Exif\0\0');
    expect(exif).toBeGreaterThan(0);
    // Tag 0x0112, SHORT, one value: 6.
    expect(kept.subarray(exif + 16, exif + 26).toString('hex')).toBe('01120003000000010006');
  });

  it('leave a PNG', async () => {
    const kept = await stored(pngWithPlace(), 'phone.png');
    expect(kept.includes(hiddenPlace)).toBe(false);
    expect(kept.includes(pngImageData)).toBe(true);
    expect(kept.subarray(-8, -4).toString('latin1')).toBe('IEND');
  });

  it('leave a TIFF, every other entry and the pixels staying where they were', async () => {
    const original = tiffWithPlace();
    const kept = await stored(original, 'scanner.tif');
    expect(kept.length).toBe(original.length);
    expect(kept.includes(hiddenPlace)).toBe(false);
    expect(kept.readUInt16LE(8)).toBe(9);
    expect(kept.subarray(10, 10 + 9 * 12).equals(original.subarray(10, 10 + 9 * 12))).toBe(true);
    const pixelsAt = original.readUInt32LE(10 + 5 * 12 + 8);
    expect(kept.subarray(pixelsAt, pixelsAt + 6).equals(original.subarray(pixelsAt, pixelsAt + 6))).toBe(true);
  });

  it('that cannot be taken out keep the file out: offsets beyond the end, directories in a ring', async () => {
    const beyond = tiffWithPlace();
    beyond.writeUInt32LE(0xfffffff0, 10 + 10 * 12 + 8);
    expect((await upload(beyond, 'beyond.tif')).status).toBe(415);
    const ring = tiffWithPlace();
    ring.writeUInt32LE(8, 10 + 11 * 12);
    expect((await upload(ring, 'ring.tif')).status).toBe(201);
  });
});

describe('evidence of a revision', () => {
  it('is seen by outsiders once submitted, carried to the next revision, detached there, and never from what was submitted', async () => {
    const id = await newDraft('ATT-2');
    const { body: file } = await upload(pdf, 'scan.pdf', {}, contributor, id);
    const path = `/submissions/${id}/attachments/${file.id}`;
    expect((await reviewer.get(path)).status).toBe(404);
    const detached = await upload(csv, 'wrong.csv', {}, contributor, id);
    expect((await contributor.request('DELETE', `/submissions/${id}/attachments/${detached.body.id}`)).status).toBe(204);
    expect((await contributor.request('DELETE', `/submissions/${id}/attachments/${detached.body.id}`)).status).toBe(404);
    await contributor.post(`/submissions/${id}/submit`);
    expect((await reviewer.get(path)).status).toBe(200);
    expect((await reviewer.get(`/submissions/${id}/attachments/${detached.body.id}`)).status).toBe(404);
    expect((await contributor.request('DELETE', path)).status).toBe(409);
    expect((await upload(pdf, 'late.pdf', {}, contributor, id)).status).toBe(409);
    await reviewer.post(`/submissions/${id}/decisions`, { revision: 1, decision: 'request-changes', comment: 'Which page?', checklist: wholeChecklist });
    const next = await contributor.post<SubmissionDetail>(`/submissions/${id}/revisions`, {});
    expect(next.body.attachments.map((one) => one.id)).toEqual([file.id]);
    expect((await contributor.request('DELETE', path)).status).toBe(204);
    expect((await reviewer.get<SubmissionDetail>(`/review/submissions/${id}`)).body.attachments.map((one) => one.id)).toEqual([file.id]);
    const attempt = app.context.db.execute(`delete from revision_attachments where attachment_id = '${file.id}'`).then(() => 'done', (error: Error) => (error.cause as { code?: string }).code);
    expect(await attempt).toBe('KA001');
  });

  it('is taken from its own people only, before the upload is read', async () => {
    const outside = await app.as(await makePerson(app.context.db, { roles: ['contributor'], labId: app.labs.second.id }));
    const colleague = await app.as(await makePerson(app.context.db, { roles: ['contributor'], labId: app.labs.first.id }));
    expect((await upload(windowsProgram, 'x.pdf', {}, outside)).status).toBe(404);
    expect((await upload(windowsProgram, 'x.pdf', {}, colleague)).status).toBe(403);
    expect((await upload(windowsProgram, 'x.pdf', {}, app.anonymous)).status).toBe(401);
    expect((await upload(windowsProgram, 'x.pdf', {}, reviewer)).status).toBe(404);
  });
});

import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { ApiError } from '../../components/api/problem';
import { DraftSaver } from '../../components/submissions/draft/DraftSaver';
import { recallDraft } from '../../components/submissions/draft/keptDraft';
import { mergeChecks, onlyTheRegisters } from '../../components/submissions/draft/useLiveChecks';
import { specimenContentSchema, type SubmissionContent } from '../../shared/contracts/content';
import type { SubmissionDetail } from '../../shared/contracts/submissions';
import { outcome } from '../../shared/domain/checks/outcome';

const content = (note: string): SubmissionContent => specimenContentSchema.parse({ kind: 'specimen', specimen: {}, provenance: {}, note });

let clock = 0;
/** What the register answers; only these members matter to the saver. */
function detail(note: string, etag: string): SubmissionDetail {
  clock += 1;
  return { id: 'one', content: content(note), etag, updatedAt: `2026-12-01T12:00:${String(clock).padStart(2, '0')}.000Z` } as SubmissionDetail;
}
const problem = (status: number, code: string) => new ApiError({ kind: 'problem', status, code, title: code, detail: code, errors: [], requestId: 'r' });
const write = (saver: DraftSaver, note: string) => saver.change((now) => ({ ...now, note }));

beforeEach(() => {
  vi.useFakeTimers();
  clock = 0;
  globalThis.localStorage.clear();
});
afterEach(() => vi.useRealTimers());

describe('keeping a draft', () => {
  it('sends once after a pause what was typed in several steps, over the state that was seen', async () => {
    const send = vi.fn(async (input: { content: SubmissionContent }) => ({ ...detail('', '"b"'), content: input.content }));
    const saver = new DraftSaver(detail('', '"a"'), { send, reload: vi.fn() });
    write(saver, 'k');
    write(saver, 'kept');
    expect(recallDraft('one')?.content.note).toBe('kept');
    await vi.advanceTimersByTimeAsync(1000);
    expect(send).toHaveBeenCalledExactlyOnceWith({ content: content('kept'), etag: '"a"' });
    expect(saver.getSnapshot().state.kind).toBe('kept');
    expect(recallDraft('one')).toBeNull();
  });

  it('takes up what a former visit could not send, and sends it when the network is back', async () => {
    const offline = new DraftSaver(detail('', '"a"'), { send: () => Promise.reject(new ApiError({ kind: 'network' })), reload: vi.fn() });
    write(offline, 'typed without a network');
    await vi.advanceTimersByTimeAsync(1000);
    expect(offline.getSnapshot().state).toEqual({ kind: 'here', offline: true });

    const send = vi.fn(async (input: { content: SubmissionContent }) => ({ ...detail('', '"b"'), content: input.content }));
    const later = new DraftSaver(detail('', '"a"'), { send, reload: vi.fn() });
    expect(later.getSnapshot().content.note).toBe('typed without a network');
    later.start();
    await vi.advanceTimersByTimeAsync(10);
    expect(send).toHaveBeenCalledOnce();
    expect(later.getSnapshot().state.kind).toBe('kept');
  });

  it('keeps both states where the register moved on, and sends neither before a choice', async () => {
    const send = vi.fn().mockRejectedValueOnce(problem(409, 'stale-revision')).mockImplementation(async (input: { content: SubmissionContent }) => ({ ...detail('', '"d"'), content: input.content }));
    const saver = new DraftSaver(detail('', '"a"'), { send, reload: async () => detail('newer', '"c"') });
    write(saver, 'mine');
    await vi.advanceTimersByTimeAsync(1000);
    const { state } = saver.getSnapshot();
    expect(state.kind === 'stale' && state.newer.content.note).toBe('newer');
    write(saver, 'mine, longer');
    await vi.advanceTimersByTimeAsync(20_000);
    expect(send).toHaveBeenCalledOnce();
    saver.keepMine();
    await vi.advanceTimersByTimeAsync(10);
    expect(send).toHaveBeenLastCalledWith({ content: content('mine, longer'), etag: '"c"' });
  });

  it('drops what was typed here only when the newer state is chosen', async () => {
    const saver = new DraftSaver(detail('', '"a"'), { send: () => Promise.reject(problem(409, 'stale-revision')), reload: async () => detail('newer', '"c"') });
    write(saver, 'mine');
    await vi.advanceTimersByTimeAsync(1000);
    expect(recallDraft('one')?.content.note).toBe('mine');
    saver.takeNewer();
    expect(saver.getSnapshot().content.note).toBe('newer');
    expect(recallDraft('one')).toBeNull();
  });

  it('sends the rest at once before submitting and says whether everything arrived', async () => {
    const sound = new DraftSaver(detail('', '"a"'), { send: async (input) => ({ ...detail('', '"b"'), content: input.content }), reload: vi.fn() });
    write(sound, 'last word');
    expect(await sound.flush()).toBe(true);
    const refused = new DraftSaver({ ...detail('', '"a"'), id: 'two' }, { send: () => Promise.reject(problem(403, 'not-allowed')), reload: vi.fn() });
    write(refused, 'last word');
    expect(await refused.flush()).toBe(false);
    expect(refused.getSnapshot().state.kind).toBe('refused');
  });
});

describe('checks of form and register together', () => {
  it('puts a finding of the register in the place of the same check that passes here', () => {
    const here = [outcome('passes', 'delineation-mixed', 'structures.0', 'one criterion'), outcome('blocks', 'missing', 'specimen.sex', 'missing')];
    const registers = onlyTheRegisters([outcome('warns', 'delineation-mixed', 'structures.0', 'others differ'), outcome('blocks', 'missing', 'specimen.sex', 'missing')], here);
    expect(registers.map((check) => check.level)).toEqual(['warns']);
    expect(mergeChecks(here, registers).map((check) => check.message)).toEqual(['missing', 'others differ']);
  });
});

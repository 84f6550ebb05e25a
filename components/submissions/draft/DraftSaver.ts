import type { SubmissionContent } from '../../../shared/contracts/content';
import type { SubmissionDetail } from '../../../shared/contracts/submissions';
import { errorInWords, isPassing, problemCode } from '../../queries/errorInWords';
import { forgetDraft, keepDraft, recallDraft } from './keptDraft';

/** Where the newest typing is: at the register, only here, refused, or in conflict with a newer state. */
export type SaveState =
  | { kind: 'kept'; at: string | null }
  | { kind: 'here'; offline: boolean }
  | { kind: 'refused'; title: string; text: string }
  | { kind: 'stale'; newer: SubmissionDetail };

export interface DraftSnapshot {
  content: SubmissionContent;
  state: SaveState;
}

type Known = Pick<SubmissionDetail, 'id' | 'content' | 'etag' | 'updatedAt'>;

interface SaverDeps {
  send: (input: { content: SubmissionContent; etag: string }) => Promise<Known>;
  /** The newest state of the register, after it said that ours is stale. */
  reload: () => Promise<SubmissionDetail>;
}

const PAUSE_MS = 800;
const RETRY_MS = 8000;

/** Same values in the same order of members: what the schema wrote. */
const same = (a: SubmissionContent, b: SubmissionContent): boolean => JSON.stringify(a) === JSON.stringify(b);

/**
 * Keeps a draft: every change at once on this device, and after a pause at the register, one request at a time.
 * A copy of a former visit that never arrived is taken up again; where the register has moved on meanwhile, both
 * states are kept until the person chooses.
 */
export class DraftSaver {
  private snapshot: DraftSnapshot;
  private etag: string;
  private seenAt: string;
  private dirty = false;
  private sending: Promise<void> | null = null;
  private timer: ReturnType<typeof setTimeout> | null = null;
  private readonly listeners = new Set<() => void>();
  private readonly id: string;

  constructor(
    detail: SubmissionDetail,
    private readonly deps: SaverDeps,
  ) {
    this.id = detail.id;
    this.etag = detail.etag;
    this.seenAt = detail.updatedAt;
    const kept = recallDraft(detail.id);
    if (kept === null || same(kept.content, detail.content)) {
      this.snapshot = { content: detail.content, state: { kind: 'kept', at: null } };
      return;
    }
    this.dirty = true;
    const state: SaveState = kept.etag === detail.etag ? { kind: 'here', offline: false } : { kind: 'stale', newer: detail };
    this.snapshot = { content: kept.content, state };
  }

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  readonly getSnapshot = (): DraftSnapshot => this.snapshot;

  private set(next: Partial<DraftSnapshot>): void {
    this.snapshot = { ...this.snapshot, ...next };
    for (const listener of this.listeners) listener();
  }

  private schedule(ms: number): void {
    if (this.timer !== null) clearTimeout(this.timer);
    this.timer = setTimeout(() => void this.send(), ms);
  }

  /** Sends what a former visit left, if anything. */
  readonly start = (): void => {
    if (this.dirty && this.snapshot.state.kind === 'here') this.schedule(0);
  };

  readonly stop = (): void => {
    if (this.timer !== null) clearTimeout(this.timer);
    this.timer = null;
    if (this.dirty && this.snapshot.state.kind === 'here') void this.send();
  };

  readonly change = (make: (content: SubmissionContent) => SubmissionContent): void => {
    const content = make(this.snapshot.content);
    if (content === this.snapshot.content) return;
    this.dirty = true;
    keepDraft(this.id, { content, etag: this.etag, keptAt: new Date().toISOString() });
    const { state } = this.snapshot;
    if (state.kind === 'stale') return this.set({ content });
    this.set({ content, state: { kind: 'here', offline: state.kind === 'here' && state.offline } });
    this.schedule(PAUSE_MS);
  };

  private async send(): Promise<void> {
    if (this.sending !== null || !this.dirty || this.snapshot.state.kind === 'stale') return;
    this.sending = this.sendOnce();
    await this.sending;
  }

  private async sendOnce(): Promise<void> {
    const { content } = this.snapshot;
    try {
      const saved = await this.deps.send({ content, etag: this.etag });
      this.sending = null;
      this.etag = saved.etag;
      this.seenAt = saved.updatedAt;
      if (this.snapshot.content === content) {
        this.dirty = false;
        forgetDraft(this.id);
        this.set({ state: { kind: 'kept', at: new Date().toISOString() } });
      } else {
        keepDraft(this.id, { content: this.snapshot.content, etag: this.etag, keptAt: new Date().toISOString() });
        this.schedule(PAUSE_MS);
      }
    } catch (error) {
      this.sending = null;
      await this.failed(error);
    }
  }

  private async failed(error: unknown): Promise<void> {
    if (problemCode(error) === 'stale-revision') {
      try {
        this.set({ state: { kind: 'stale', newer: await this.deps.reload() } });
      } catch {
        this.waitForNetwork();
      }
    } else if (isPassing(error)) this.waitForNetwork();
    else this.set({ state: { kind: 'refused', ...errorInWords(error) } });
  }

  private waitForNetwork(): void {
    this.set({ state: { kind: 'here', offline: true } });
    this.schedule(RETRY_MS);
  }

  /** Tries again now: the network is back, or the person asks. */
  readonly retry = (): void => {
    if (this.dirty) void this.send();
  };

  /** Sends what is left and waits for it. Returns whether the register has everything now. */
  readonly flush = async (): Promise<boolean> => {
    for (let round = 0; round < 5; round += 1) {
      if (this.timer !== null) clearTimeout(this.timer);
      await this.sending;
      if (!this.dirty) return true;
      await this.send();
      if (this.snapshot.state.kind === 'stale' || this.snapshot.state.kind === 'refused') return false;
    }
    return !this.dirty;
  };

  /** Takes over a newer state of the register where nothing typed here stands against it. */
  readonly adopt = (detail: Known): void => {
    if (this.dirty || this.sending !== null || detail.etag === this.etag || detail.updatedAt <= this.seenAt) return;
    this.etag = detail.etag;
    this.seenAt = detail.updatedAt;
    if (!same(detail.content, this.snapshot.content)) this.set({ content: detail.content });
  };

  /** Of two states: drops what was typed here. */
  readonly takeNewer = (): void => {
    const { state } = this.snapshot;
    if (state.kind !== 'stale') return;
    this.etag = state.newer.etag;
    this.seenAt = state.newer.updatedAt;
    this.dirty = false;
    forgetDraft(this.id);
    this.set({ content: state.newer.content, state: { kind: 'kept', at: null } });
  };

  /** Of two states: sends what was typed here over the newer one. */
  readonly keepMine = (): void => {
    const { state } = this.snapshot;
    if (state.kind !== 'stale') return;
    this.etag = state.newer.etag;
    this.seenAt = state.newer.updatedAt;
    this.set({ state: { kind: 'here', offline: false } });
    this.schedule(0);
  };
}

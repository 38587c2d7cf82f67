import { applyEntry } from '@/lib/case/apply-entry';
import type { CaseState } from '@/lib/case/case-state';
import type { CaseCommand } from '@/lib/case/commands';
import type { CaseEntry } from '@/lib/case/entry-bodies';
import { initialState } from '@/lib/case/initial-state';
import { upcast } from '@/lib/case/upcast';
import { commandReplySchema, entriesReplySchema } from '@/lib/contracts/http/replies';
import type { Answer, CaseClient, Credentials } from '@/server/demo/case-client';

/** A command in its envelope, made once: every repeat is the same. */
export interface Envelope {
  readonly commandId: string;
  readonly eventAt: string;
  readonly command: CaseCommand;
}

/** A case as the log tells it, read over the public interface and folded as a screen does. */
export class FollowedCase {
  state: CaseState;

  constructor(
    private readonly client: CaseClient,
    readonly caseId: string,
    private readonly reader: Credentials,
  ) {
    this.state = initialState(caseId);
  }

  /** Reads what came since, from whoever it came. Gives the new entries. */
  async catchUp(): Promise<readonly CaseEntry[]> {
    const arrived: CaseEntry[] = [];
    for (let hasMore = true; hasMore; ) {
      const page = await this.client.ask({ method: 'GET', path: `/api/cases/${this.caseId}/entries?after=${this.state.seq}`, as: this.reader }, entriesReplySchema);
      if (!page.isOk) throw new Error(page.refusal.message);
      for (const wire of page.body.entries) {
        this.state = applyEntry(this.state, wire);
        const entry = upcast(wire);
        if (entry !== null) arrived.push(entry);
      }
      hasMore = page.body.hasMore;
    }
    return arrived;
  }

  /** Gives a command; the answer comes only after it was committed, or when the case refuses it. */
  give(envelope: Envelope, as: Credentials): Promise<Answer<unknown>> {
    return this.client.ask({ method: 'POST', path: `/api/cases/${this.caseId}/commands`, as, body: envelope }, commandReplySchema);
  }
}

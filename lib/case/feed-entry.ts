/** An entry as it arrives, before its kind is known. `body` is null where the viewer may not read it. */
export interface FeedEntry {
  readonly seq: number;
  readonly hash: string;
  readonly previousHash: string;
  readonly kind: string;
  readonly kindVersion: number;
  readonly eventAt: string;
  readonly recordedAt: string;
  readonly commandId: string;
  readonly author: { readonly id: string; readonly role: string; readonly displayName: string };
  readonly body: Readonly<Record<string, unknown>> | null;
}

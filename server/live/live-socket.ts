import type { Server, Socket } from 'socket.io';

import type { FollowReply, PulseMessage, EndedMessage, EntriesMessage } from '@/lib/contracts/channel/messages';
import type { CommandReply } from '@/lib/contracts/http/replies';
import type { Visitor } from '@/server/queries/open-case';

/** What viewers send; every payload is unknown until the contract has read it. */
export interface FromViewer {
  follow: (message: unknown, answer: unknown) => void;
  command: (message: unknown, answer: unknown) => void;
  painted: (message: unknown, answer: unknown) => void;
}

/** What viewers get. */
export interface ToViewer {
  entries: (message: EntriesMessage) => void;
  pulse: (message: PulseMessage) => void;
  ended: (message: EndedMessage) => void;
}

/** What the server remembers of an open socket. */
export interface SocketFacts {
  visitor: Visitor;
  /** Session of a person, null for a wall. */
  sessionId: string | null;
  /** Name of the person, empty for a wall. */
  displayName: string;
  isDesk: boolean;
  /** Cases it follows. */
  caseIds: Set<string>;
}

export type LiveSocket = Socket<FromViewer, ToViewer, Record<string, never>, SocketFacts>;
export type LiveServer = Server<FromViewer, ToViewer, Record<string, never>, SocketFacts>;

/** An answer to `follow` or `command`. */
export type Answer = FollowReply | CommandReply | { readonly kind: 'noted' };

/** Answers when the viewer asked for an answer; a client may send anything in its place. */
export function reply(answer: unknown, message: Answer): void {
  if (typeof answer === 'function') (answer as (message: Answer) => void)(message);
}

/** Rooms of a case: walls get cut entries, people whole ones. */
export const roomOf = (caseId: string, kind: Visitor['kind']): string => `${kind} ${caseId}`;

import type { EndedMessage } from '@/lib/contracts/channel/messages';
import { roomOf, type LiveServer, type LiveSocket } from '@/server/live/live-socket';
import type { Presence } from '@/server/cases/presence';
import type { Pump } from '@/server/live/pump';

/** Every way in which following ends. */
export interface Departures {
  /** Out of the room of one case, untold. */
  leave(socket: LiveSocket, caseId: string): void;
  /** One case of a socket: told, and out of its room. */
  endCase(socket: LiveSocket, caseId: string, reason: EndedMessage['reason']): void;
  /** The whole socket: told for each case, then closed. */
  cut(socket: LiveSocket, reason: EndedMessage['reason']): void;
  /** The socket is gone by itself. */
  forget(socket: LiveSocket): void;
  /** Walls of a case that closed. */
  endWalls(caseId: string): void;
}

/** Keeps rooms, presence and pump in step with who is there. */
export function makeDepartures(io: LiveServer, presence: Presence, pump: Pick<Pump, 'unwatch'>): Departures {
  function leave(socket: LiveSocket, caseId: string): void {
    socket.data.caseIds.delete(caseId);
    presence.leave(caseId, socket.id);
    void socket.leave(roomOf(caseId, socket.data.visitor.kind));
    const { rooms } = io.of('/').adapter;
    if (!rooms.has(roomOf(caseId, 'person')) && !rooms.has(roomOf(caseId, 'screen'))) pump.unwatch(caseId);
  }

  function endCase(socket: LiveSocket, caseId: string, reason: EndedMessage['reason']): void {
    socket.emit('ended', { caseId, reason });
    leave(socket, caseId);
  }

  function cut(socket: LiveSocket, reason: EndedMessage['reason']): void {
    for (const caseId of [...socket.data.caseIds]) endCase(socket, caseId, reason);
    socket.disconnect(true);
  }

  return {
    leave,
    endCase,
    cut,
    forget: (socket) => [...socket.data.caseIds].forEach((caseId) => leave(socket, caseId)),
    endWalls(caseId) {
      for (const socketId of [...(io.of('/').adapter.rooms.get(roomOf(caseId, 'screen')) ?? [])]) {
        const socket = io.of('/').sockets.get(socketId) as LiveSocket | undefined;
        if (socket !== undefined) cut(socket, 'case-closed');
      }
    },
  };
}

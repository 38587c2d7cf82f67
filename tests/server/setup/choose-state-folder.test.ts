import { chmodSync, mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { chooseStateFolder } from '@/server/setup/state-folder.mjs';

const top = mkdtempSync(path.join(os.tmpdir(), 'fascicle-folder-'));
const clone = path.join(top, 'home', 'clone');

describe('chooseStateFolder', () => {
  beforeAll(() => {
    mkdirSync(clone, { recursive: true });
    chmodSync(top, 0o755);
  });
  afterAll(() => rmSync(top, { recursive: true, force: true }));

  it('is the clone for root when others may enter its parents', () => {
    chmodSync(path.dirname(clone), 0o711);
    expect(chooseStateFolder(clone, { uid: 0 })).toBe(path.join(clone, '.fascicle'));
  });

  it("is the system's state folder for root when a parent is closed to others", () => {
    chmodSync(path.dirname(clone), 0o700);
    expect(chooseStateFolder(clone, { uid: 0 })).toMatch(/^\/var\/lib\/fascicle\/[0-9a-f]{12}$/);
  });

  it('differs from clone to clone', () => {
    mkdirSync(path.join(top, 'home', 'second'));
    expect(chooseStateFolder(path.join(top, 'home', 'second'), { uid: 0 })).not.toBe(chooseStateFolder(clone, { uid: 0 }));
  });

  it('is the clone for a person who may write there, else below the home folder', () => {
    expect(chooseStateFolder(clone, { uid: 1000, home: '/home/somebody' })).toBe(path.join(clone, '.fascicle'));
    expect(chooseStateFolder('/proc/sys', { uid: 1000, home: '/home/somebody' })).toMatch(/^\/home\/somebody\/\.local\/state\/fascicle\/[0-9a-f]{12}$/);
  });

  it('is what was wished for, and a wish that depends on where one stands is refused', () => {
    expect(chooseStateFolder(clone, { wish: '/srv/fascicle' })).toBe('/srv/fascicle');
    expect(() => chooseStateFolder(clone, { wish: 'state' })).toThrow('FASCICLE_STATE_FOLDER is "state"; it must be an absolute folder');
  });
});

/**
 * Colour by meaning; the renderer knows the theme. Priority tones are for watch, notice and alert, nothing else. On paper
 * yellow needs an edge around what is drawn and a ground behind what is written; both are nothing in the dark.
 */
export type Tone = 'ink' | 'second' | 'rule' | 'ghost' | 'ground' | 'high' | 'medium' | 'medium-edge' | 'medium-back' | 'low';

/** One shape, in px of the scene, x to the right and y down. `role` names what it stands for; roles may repeat. */
export type Shape =
  | {
      readonly kind: 'line';
      readonly key: string;
      readonly role: string;
      readonly tone: Tone;
      readonly x1: number;
      readonly y1: number;
      readonly x2: number;
      readonly y2: number;
      readonly widthPx: number;
      readonly dashPx: readonly number[] | null;
      /** How far into the pattern of dashes the line begins; 0 when left out. */
      readonly dashOffsetPx?: number;
    }
  | {
      readonly kind: 'rect';
      readonly key: string;
      readonly role: string;
      readonly tone: Tone;
      readonly x: number;
      readonly y: number;
      readonly widthPx: number;
      readonly heightPx: number;
      /** Null fills the rectangle; a number only draws its edge. */
      readonly strokePx: number | null;
      readonly dashPx: readonly number[] | null;
    }
  | {
      readonly kind: 'node';
      readonly key: string;
      readonly role: string;
      readonly tone: Tone;
      readonly x: number;
      readonly y: number;
      readonly radiusPx: number;
      /** Null fills the circle; a number draws its edge on the ground. */
      readonly strokePx: number | null;
    }
  | {
      readonly kind: 'text';
      readonly key: string;
      readonly role: string;
      readonly tone: Tone;
      /** Middle of the text. */
      readonly x: number;
      /** Baseline of the text. */
      readonly y: number;
      readonly sizePx: number;
      /** Room kept for the text: a conservative estimate, never less than what is drawn. */
      readonly widthPx: number;
      readonly isMono: boolean;
      readonly isBold: boolean;
      readonly text: string;
    };

/** A picture as numbers, and the sentence that says what it shows. Drawn alike on a screen and on paper. */
export interface Scene {
  readonly widthPx: number;
  readonly heightPx: number;
  readonly description: string;
  readonly shapes: readonly Shape[];
}

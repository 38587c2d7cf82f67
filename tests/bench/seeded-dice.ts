/** Dice that fall the same way for the same seed: numbers from 0 up to 1 (a linear congruential generator, constants from memory). */
export function seededDice(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 32;
  };
}

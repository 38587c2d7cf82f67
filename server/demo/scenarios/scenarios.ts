import type { Scenario } from '@/server/demo/scenario';
import { neuroma } from '@/server/demo/scenarios/neuroma';
import { relaxant } from '@/server/demo/scenarios/relaxant';
import { tourniquet } from '@/server/demo/scenarios/tourniquet';
import { tumour } from '@/server/demo/scenarios/tumour';
import { ulnar } from '@/server/demo/scenarios/ulnar';

/** Every case that can be played; the first one is played when none is named. */
export const scenarios: readonly [Scenario, ...Scenario[]] = [ulnar, tumour, neuroma, relaxant, tourniquet];

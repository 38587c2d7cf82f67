/** Published or hand-worked velocities. `printed` values carry the digits of the page, `worked` ones four decimals. */
export interface VelocityCase {
  readonly name: string;
  readonly distanceMm: number;
  readonly proximalOnsetMs: number;
  /** Null for a nerve response from one site. */
  readonly distalOnsetMs: number | null;
  readonly expectedMps: number;
  readonly kind: 'printed' | 'mean' | 'worked';
  readonly source: string;
}

const worked = 'Distance over time, worked apart from this code to four decimals';

export const velocityCases: readonly VelocityCase[] = [
  {
    name: 'ulnar motor, 225 and 20 mm added',
    distanceMm: 245,
    proximalOnsetMs: 6.5,
    distalOnsetMs: 2.7,
    expectedMps: 64.5,
    kind: 'printed',
    source: 'Japanese national physiotherapy examination 47, morning question 4, answer 64.5 m/s',
  },
  {
    name: 'two points, 100 mm in 2 ms',
    distanceMm: 100,
    proximalOnsetMs: 4,
    distalOnsetMs: 2,
    expectedMps: 50,
    kind: 'printed',
    source: 'Worked example of a public tutorial on nerve conduction, 50 m/s; only the difference of 2 ms is given there',
  },
  {
    name: 'motor file of the EDF+ specification',
    distanceMm: 285 - 65,
    proximalOnsetMs: 7.8,
    distalOnsetMs: 3.8,
    expectedMps: 55,
    kind: 'printed',
    source: 'EDF+ specification, motor nerve conduction file: 6.5 cm and 28.5 cm, 3.8 ms and 7.8 ms, 55.0 m/s',
  },
  {
    name: 'median sensory at the palm',
    distanceMm: 70.6,
    proximalOnsetMs: 1.14,
    distalOnsetMs: null,
    expectedMps: 61.9,
    kind: 'mean',
    source: 'Jpn J Rehabil Med 42(5):320: mean onset 1.14 ms, mean velocity 61.9 m/s; distance implied by both',
  },
  {
    name: 'median sensory at the wrist',
    distanceMm: 140,
    proximalOnsetMs: 2.39,
    distalOnsetMs: null,
    expectedMps: 58.6,
    kind: 'mean',
    source: 'Jpn J Rehabil Med 42(5):320: mean onset 2.39 ms, mean velocity 58.6 m/s; distance implied by both',
  },
  {
    name: 'antebrachial cutaneous over 10 cm',
    distanceMm: 100,
    proximalOnsetMs: 1.7,
    distalOnsetMs: null,
    expectedMps: 58.8235,
    kind: 'worked',
    source: `10 cm and 1.7 ms: PMID 17206931 and 11128890. ${worked}`,
  },
  {
    name: 'antebrachial cutaneous from the peak by mistake',
    distanceMm: 100,
    proximalOnsetMs: 2.2,
    distalOnsetMs: null,
    expectedMps: 45.4545,
    kind: 'worked',
    source: `10 cm and mean peak 2.2 ms: PMID 17206931 and 11128890. ${worked}`,
  },
  { name: 'median motor, elbow to wrist', distanceMm: 230, proximalOnsetMs: 7.6, distalOnsetMs: 3.4, expectedMps: 54.7619, kind: 'worked', source: worked },
  { name: 'ulnar across the elbow', distanceMm: 100, proximalOnsetMs: 9.1, distalOnsetMs: 7.4, expectedMps: 58.8235, kind: 'worked', source: worked },
  { name: 'fibular motor', distanceMm: 320, proximalOnsetMs: 12.1, distalOnsetMs: 4.8, expectedMps: 43.8356, kind: 'worked', source: worked },
  { name: 'tibial motor', distanceMm: 370, proximalOnsetMs: 13.6, distalOnsetMs: 4.5, expectedMps: 40.6593, kind: 'worked', source: worked },
  { name: 'sensory from one site', distanceMm: 140, proximalOnsetMs: 2.5, distalOnsetMs: null, expectedMps: 56, kind: 'worked', source: worked },
  { name: 'tape and marks off together, fast', distanceMm: 102, proximalOnsetMs: 3.9, distalOnsetMs: 2, expectedMps: 53.7, kind: 'printed', source: 'Worst case of 100 mm and 2 ms: +2 mm with −0.1 ms, worked by hand to one decimal' },
  { name: 'tape and marks off together, slow', distanceMm: 98, proximalOnsetMs: 4.1, distalOnsetMs: 2, expectedMps: 46.7, kind: 'printed', source: 'Worst case of 100 mm and 2 ms: −2 mm with +0.1 ms, worked by hand to one decimal' },
  { name: 'one cursor step late over 40 mm', distanceMm: 40, proximalOnsetMs: 4.767, distalOnsetMs: 4, expectedMps: 52.1512, kind: 'worked', source: `Cursor step of 0.1 ms at 40 mm and 60 m/s. ${worked}` },
  { name: 'one cursor step early over 40 mm', distanceMm: 40, proximalOnsetMs: 4.567, distalOnsetMs: 4, expectedMps: 70.5467, kind: 'worked', source: `Cursor step of 0.1 ms at 40 mm and 60 m/s. ${worked}` },
];

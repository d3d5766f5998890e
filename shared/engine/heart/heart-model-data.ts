/**
 * The numbers of the ventricular and atrial model, version 2. Heart coordinates are millimetres along (u, l, p):
 * u from base to apex, l from septum to left free wall, p toward the inferior wall; the origin is the centre of
 * the left ventricular ellipsoid. Times are ms, speeds mm/ms (= m/s), voltages mV.
 *
 * Provenance. Mechanism and lead algebra are physics; most numbers are fitted: orientation, speeds, places and
 * delays of the fascicles, retrograde latencies, surface weights, several sites and every repolarization number
 * were tuned by random and Gauss–Newton search against the acceptance ranges that tests/fixtures/
 * heart-model-checks.json lists with their sources. Ellipsoid sizes are plausible adult values (from memory).
 */

/** Golden heart vectors bind this version only. */
export const heartModelVersion = 2;

/** A point or direction, heart or body axes as said at the place of use. */
export type Vector3 = readonly [number, number, number];

export interface Ellipsoid {
  /** mm, heart axes. */
  centre: Vector3;
  /** mm along u, l, p. */
  semiAxes: Vector3;
}

/** Angles that place the heart in the body (Frank axes), degrees; tuned. */
export const orientation = { azimuthDeg: 47.809, elevationDeg: 43, rollDeg: 1.98 } as const;

/** The five surfaces that carry nodes, in node order. */
export const shellNames = ['lvEndo', 'lvMid', 'lvEpi', 'rvEndo', 'rvEpi'] as const;
export type Shell = (typeof shellNames)[number];

/** Anatomical class of a node. */
export type Wall = Shell | 'rvSeptalEndo' | 'insertion' | 'lvBase';

export const ellipsoids: Readonly<Record<Shell, Ellipsoid>> = {
  lvEndo: { centre: [0, 0, 0], semiAxes: [48, 23, 23] },
  lvMid: { centre: [0, 0, 0], semiAxes: [53, 28.5, 28.5] },
  lvEpi: { centre: [0, 0, 0], semiAxes: [58, 34, 34] },
  rvEndo: { centre: [-6, -26, -6], semiAxes: [47.5, 31.5, 35.5] },
  rvEpi: { centre: [-6, -26, -6], semiAxes: [52, 36, 40] },
};

/** Plane of the left ventricular base, mm along u. */
export const lvBaseU = -22;
/** The right ventricular base plane drops by this per mm toward anterior: it leaves a conus. */
export const rvBaseTilt = 0.55;

/** Points drawn on each whole ellipsoid, before cutting, and nodes of the base ring. */
export type NodeCounts = Readonly<Record<Shell | 'base', number>>;
/** The counts the model was fitted with; other counts need other fitted numbers. */
export const fittedNodeCounts: NodeCounts = {
  lvEndo: 360,
  lvMid: 360,
  lvEpi: 520,
  rvEndo: 400,
  rvEpi: 440,
  base: 40,
};
/** Each node's area is averaged over this many times as many points. */
export const finePointFactor = 16;

/** Share of the drawn area that counts: a thinner right ventricle than drawn (tuned). */
export const surfaceWeights = { rvFreeWall: 0.565, rvSeptalSurface: 0.827, others: 1 } as const;

/** How neighbours are chosen. */
export const graphRules = {
  nearestNodes: 24,
  /** Slack of the test that an edge runs in muscle, on the ellipsoid level. */
  insideTolerance: 0.03,
  basePlaneSlackMm: 2,
  purkinjeNearestTwins: 10,
  purkinjeMaxEdgeMm: 22,
  purkinjeMinU: -20,
} as const;

/**
 * Speeds (mm/ms) and latencies (ms), all tuned. The Purkinje speed is an effective endocardial one, below the
 * 2–4 m/s measured in Purkinje fibres (from memory).
 */
export const conduction = {
  tangentialSpeed: 0.712,
  transmuralSpeed: 0.421,
  septalTransmuralSpeed: 0.5,
  rvFreeWallSpeedFactor: 1.193,
  purkinjeSpeed: 1.329,
  purkinjeCrossTerritoryFactor: 0.398,
  anterogradeMs: 3,
  retrogradeLvMs: 57.76,
  retrogradeRvMs: 43.681,
  muscleSeedRadiusMm: 12,
  purkinjeSeedRadiusMm: 10,
} as const;

/** A place where the conduction system enters the endocardial network. */
export type Fascicle = 'LAF' | 'LSF' | 'LPF' | 'RBB';
export type Network = 'lv' | 'rv';

/** Exits of the left anterior, septal and posterior fascicle and of the right bundle, and their native delays (tuned). */
export const fascicles: Readonly<Record<Fascicle, { exit: Vector3; delayMs: number; network: Network }>> = {
  LAF: { exit: [4.6, -8.5, -21.3], delayMs: 0, network: 'lv' },
  LSF: { exit: [19.6, -19.1, -8.6], delayMs: 15.4, network: 'lv' },
  LPF: { exit: [23.2, 13.4, 15], delayMs: 9.9, network: 'lv' },
  RBB: { exit: [31.7, -44.5, -11.5], delayMs: 3.4, network: 'rv' },
};

/** Places where muscle is stimulated or a focus sits. */
export const muscleSites = {
  rvApex: [34.9, -38.7, -12],
  rvSept: [12.6, -33.1, 1.7],
  rvOt: [-12, -28.4, -17.3],
  rvFree: [-1, -57.3, -5],
  lvLat: [11.9, 33.2, 1.7],
  lvPostlat: [4.8, 31.8, 11.6],
  lvAnt: [5, 7.6, -33],
  lvAntlat: [5, 24, -24],
  lvApex: [58, 0, 0],
  lvBasalPost: [-15, 19.8, 26.2],
  lvInf: [5, 3.5, 33.7],
  lvSummit: [-18, 14.2, -29.1],
  hisSept: [-18, -32.1, -3.4],
  lbb: [-14.4, -27.4, -1.9],
} as const satisfies Record<string, Vector3>;
export type MuscleSite = keyof typeof muscleSites;

/** Shape of the one action potential (tuned; product of logistics after van Oosterom and Jacquemet 2005, from memory). */
export const actionPotential = {
  upstrokeSigmaMs: 3.6,
  plateauSlopePerMs: 0.0011,
  recoveryTau1Ms: 42,
  recoveryTau2Ms: 13,
} as const;

/** Action potential duration over the heart, ms (tuned). `depth` is the transmural coordinate of each wall. */
export const apdModel = {
  baseMs: 328.653,
  transmural: 12.9202,
  apical: -10.2031,
  lateral: -16.7902,
  inferior: 4.2345,
  rvFreeWall: -14.1396,
  /** Shortening per ms of later activation. */
  activationSlope: 0.319,
  /** The intrinsic gradient fades when activation is dispersed: a tuned device, not physiology. */
  gradientMin: 0.1,
  dispersionOnsetMs: 18,
  dispersionScaleMs: 5,
  depth: {
    lvEndo: 1,
    lvMid: 0,
    lvEpi: -1,
    rvSeptalEndo: -0.7037,
    rvEndo: 0.5,
    insertion: -0.3,
    rvEpi: -0.5,
    lvBase: 0,
  },
} as const satisfies { depth: Record<Wall, number> } & Record<string, unknown>;

/**
 * Transmural injury: muscle around a centre loses part of its plateau, as a bell with this radius. Centres were chosen by
 * scanning the surface for the expected native ST pattern (LAD, RCA, LCX and the inferobasal wall).
 */
export const injuryModel = {
  radiusMm: 24,
  centres: {
    anterior: [24.9, -5.4, -30.2],
    inferior: [40.9, 4.5, 23.7],
    lateral: [4.3, 22.1, -25.7],
    posterior: [-5.7, 32.1, 10.7],
  },
} as const satisfies { radiusMm: number; centres: Record<string, Vector3> };
export type InjuredTerritory = keyof (typeof injuryModel)['centres'];

/** mV per 1000 mm² of unbalanced surface; set so that the normal R in lead II is 1.15 mV. */
export const dipoleScale = 0.67436;

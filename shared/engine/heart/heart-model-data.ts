/**
 * The numbers of the ventricular and atrial model, version 3. Heart coordinates are millimetres along (u, l, p):
 * u from base to apex, l from septum to left free wall, p toward the inferior wall; the origin is the centre of
 * the left ventricular ellipsoid. Times are ms, speeds mm/ms (= m/s), voltages mV.
 *
 * Provenance. Mechanism and lead algebra are physics; most numbers are fitted: orientation, speeds, places and
 * delays of the fascicles, retrograde latencies, surface weights, several sites and every repolarization number
 * were tuned by random and Gauss–Newton search against the acceptance ranges that tests/fixtures/
 * heart-model-checks.json lists with their sources. Ellipsoid sizes are plausible adult values (from memory).
 */

/** Golden heart vectors bind this version only. */
export const heartModelVersion = 3;

/** A point or direction, heart or body axes as said at the place of use. */
export type Vector3 = readonly [number, number, number];

export interface Ellipsoid {
  /** mm, heart axes. */
  centre: Vector3;
  /** mm along u, l, p. */
  semiAxes: Vector3;
}

/** Angles that place the heart in the body (Frank axes), degrees; tuned. */
export const orientation = { azimuthDeg: 38.054, elevationDeg: 46.525, rollDeg: 3.971 } as const;

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
  tangentialSpeed: 0.696,
  transmuralSpeed: 0.401,
  septalTransmuralSpeed: 0.536,
  rvFreeWallSpeedFactor: 1.314,
  purkinjeSpeed: 1.311,
  purkinjeCrossTerritoryFactor: 0.515,
  anterogradeMs: 3,
  retrogradeLvMs: 7.21,
  retrogradeRvMs: 39.88,
  muscleSeedRadiusMm: 12,
  purkinjeSeedRadiusMm: 10,
} as const;

/** A place where the conduction system enters the endocardial network. */
export type Fascicle = 'LAF' | 'LSF' | 'LPF' | 'RBB';
export type Network = 'lv' | 'rv';

/** Exits of the left anterior, septal and posterior fascicle and of the right bundle, and their native delays (tuned). */
export const fascicles: Readonly<Record<Fascicle, { exit: Vector3; delayMs: number; network: Network }>> = {
  LAF: { exit: [2.95, -7.85, -23.15], delayMs: -1.08, network: 'lv' },
  LSF: { exit: [20.49, -20.89, -5.9], delayMs: 16.98, network: 'lv' },
  LPF: { exit: [26.35, 14.33, 14.16], delayMs: 8.38, network: 'lv' },
  RBB: { exit: [37.1, -46.47, -10.16], delayMs: 3.89, network: 'rv' },
};

/** Places where muscle is stimulated or a focus sits. */
export const muscleSites = {
  rvApex: [36.29, -44.42, -10.9],
  rvSept: [15.96, -32.65, 7.39],
  rvOt: [-12.75, -21.68, -13.92],
  rvFree: [-1, -57.3, -5],
  lvLat: [18.32, 29.79, -2.43],
  lvPostlat: [12.51, 34.45, 13.8],
  lvAnt: [5, 7.6, -33],
  lvAntlat: [5, 24, -24],
  lvApex: [58, 0, 0],
  lvBasalPost: [-15, 19.8, 26.2],
  lvInf: [5, 3.5, 33.7],
  lvSummit: [-18, 14.2, -29.1],
  hisSept: [-17.98, -36.07, 1.75],
  lbb: [-20.0, -30.74, -3.65],
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
  baseMs: 327.912,
  transmural: 18.658,
  apical: -9.553,
  lateral: -13.043,
  inferior: 4.224,
  rvFreeWall: -16.117,
  /** Shortening per ms of later activation. */
  activationSlope: 0.29,
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

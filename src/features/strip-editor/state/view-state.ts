import type { Bandwidth } from '../../../../shared/parameters/recorder';

/** What is drawn of the two traces that a strip has. */
export type TraceChoice = 'electrodes' | 'recorded' | 'both';

/** How the strip is looked at; none of it is kept with the strip. */
export interface ViewState {
  /** All twelve leads instead of the sheet's. */
  twelve: boolean;
  trace: TraceChoice;
  /** A second bandwidth drawn under the first, on the same time axis. */
  compare: Exclude<Bandwidth, object> | null;
  calipers: boolean;
  /** Times 100 %. */
  zoom: number;
  /** Numbers of the beats that are chosen. */
  chosenBeats: readonly number[];
  /** The beat under the pointer. */
  hoverBeat: number | null;
  /** The device's sensing windows behind the ladder. */
  windows: boolean;
}

export const startView: ViewState = {
  twelve: false,
  trace: 'both',
  compare: null,
  calipers: false,
  zoom: 1,
  chosenBeats: [],
  hoverBeat: null,
  windows: false,
};

export const zoomSteps = [0.5, 0.75, 1, 1.5, 2, 3] as const;

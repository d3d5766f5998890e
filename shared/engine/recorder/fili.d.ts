/** The parts of fili 2.0.3 that are used here; the package ships no types. */
declare module 'fili' {
  /** One second-order section: y = k (b0 + b1/z + b2/z²) / (1 + a1/z + a2/z²). */
  export interface FiliBiquad {
    a: [number, number];
    b: [number, number, number];
    k: number;
    z: [number, number];
  }

  export interface FiliDesign {
    /** Number of second-order sections. */
    order: number;
    characteristic: 'butterworth';
    Fs: number;
    Fc: number;
    /** Width of a band in octaves. */
    BW?: number;
    gain: number;
    preGain: boolean;
  }

  export class CalcCascades {
    lowpass(design: FiliDesign): FiliBiquad[];
    bandpass(design: FiliDesign): FiliBiquad[];
    bandstop(design: FiliDesign): FiliBiquad[];
  }

  export class IirFilter {
    constructor(sections: FiliBiquad[]);
    singleStep(input: number): number;
    multiStep(input: number[] | Float64Array, inPlace?: boolean): number[];
    responsePoint(at: { Fs: number; Fr: number }): { magnitude: number; phase: number };
  }

  /** A radix-2 Fourier transform of real samples. */
  export class Fft {
    /** @param length a power of two */
    constructor(length: number);
    /** Transforms `length` samples; `window` names a window that is laid over them. */
    forward(samples: Float64Array | number[], window: 'none'): { re: Float64Array; im: Float64Array };
  }

  const Fili: { CalcCascades: typeof CalcCascades; IirFilter: typeof IirFilter; Fft: typeof Fft };
  export default Fili;
}

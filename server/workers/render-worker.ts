import { move } from 'piscina';
import { renderStrip } from '../../shared/engine/render';
import { encodeStripBinary } from '../../shared/formats/strip-binary';
import type { StripParameters } from '../../shared/parameters/strip-parameters';
import { renderUnquantised } from './render-unquantised';

export interface RenderTask {
  parameters: StripParameters;
  unquantised: boolean;
}

/** Renders and encodes one strip; the bytes are moved, not copied, to the thread that asked. */
export default function render({ parameters, unquantised }: RenderTask) {
  const strip = unquantised ? renderUnquantised(parameters) : renderStrip(parameters);
  return move(encodeStripBinary(strip).buffer);
}

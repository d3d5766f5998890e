import { version } from '../../package.json';

/** Version of the product, as package.json has it. */
export const productVersion: string = version;

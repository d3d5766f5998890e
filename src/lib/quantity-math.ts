// The part of mathjs that typed quantities need, in a file of its own so that it is loaded only when needed.
export { evaluate, isUnit } from 'mathjs';

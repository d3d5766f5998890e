export { stripIdSchema } from '../parameters/strip-id';

// Texts that people type are part of a strip's contract; requests take them by the same rules.
export { foldText, isPlainText, plainText, plainTextRule, requiredText } from '../parameters/text';

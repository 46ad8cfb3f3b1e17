export { convert, massFractionPerUnit, unitFactorExponent, type Converted } from './convert';
export { isDecimalText, isZeroText, numberFromDecimal, shiftDecimal } from './decimal-text';
export { parseUnit, type Dimension, type ParsedUnit, type Unit } from './unit';

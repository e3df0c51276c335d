export { AnswerPlots } from './AnswerPlots';
export { RelationCurve } from './RelationCurve';
/** Needs the engine as the drawings do: one part of the program for both. */
export { RelationSheet } from '../quick/RelationSheet';

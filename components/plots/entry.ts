export { AnswerPlots } from './AnswerPlots';
export { RelationCurve } from './RelationCurve';

/** The public door of the assessment: forecast hours in, a go or hold with its reasons out. */
export { assess, judge } from './assess.ts';
export type { AnswerOptions } from './answer-of.ts';
export { chanceOf, eachMember, prepareEnsemble, type Chance } from './ensemble.ts';
export { morningOf, type Morning } from './morning.ts';
export { nextBetterMorning, type AssessedMorning, type BetterMorning } from './next-better-morning.ts';
export { checkOnSite, type OnSite, type OnSiteFinding } from './on-site-check.ts';
export { prepareMorning, type PreparedMorning, type Weather } from './prepare.ts';
export { parseCase, type CaseProblem } from './problems.ts';
export { bestWindowOf, headlineOf, retell, type SentenceOptions } from './sentences.ts';
export type { PlanToJudge } from './track.ts';
export { withoutFreshData } from './without-fresh-data.ts';

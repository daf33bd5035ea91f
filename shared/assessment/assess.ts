import type { AssessmentAnswer } from './answer.ts';
import { answerOf, type AnswerOptions } from './answer-of.ts';
import type { AssessmentCase } from './case.ts';
import { prepareMorning, type PreparedMorning } from './prepare.ts';
import type { PlanToJudge } from './track.ts';
import { decide } from './verdict.ts';

/** Judges one plan on a morning that was prepared once; the steps of the answer are built when first read. */
export const judge = (morning: PreparedMorning, plan: PlanToJudge, options: AnswerOptions = {}): AssessmentAnswer => answerOf(decide(morning, plan), options);

/**
 * Assesses one case: is this morning fit for this job?
 * @param theCase as `parseCase` gives it
 * @returns the answer of the contract; never a go on missing or contradictory data
 */
export const assess = (theCase: AssessmentCase, options: AnswerOptions = {}): AssessmentAnswer => judge(prepareMorning(theCase), theCase, options);

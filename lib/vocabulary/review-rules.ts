/** Which changes need a program manager's signature beside the reviewer's. */
export interface ProgramManagerRules {
  terms: boolean;
  limit: boolean;
  /** Fluid, state, speed or hours of an operating point. */
  operatingPointState: boolean;
  finish: boolean;
  allocations: boolean;
  addOrRetire: boolean;
  /** A grade raised by this many steps at once. */
  gradeSteps: number;
  /** A grade raised to one of the measured ones. */
  measuredGrade: boolean;
  /** Growth released by raised grades, in per cent of the limit, within the window. */
  releasedGrowthPercent: number;
  windowDays: number;
  /** A range caution that the base revision didn't carry. */
  rangeCaution: boolean;
  /** Rise of the predicted total, in per cent of the limit, at any operating point. */
  predictedRisePercent: number;
  standingWorse: boolean;
}

export interface ReviewRules {
  /** Independent reviewers that must approve: never fewer than one. */
  reviewers: number;
  programManagerOn: ProgramManagerRules;
}

export const DEFAULT_REVIEW_RULES: ReviewRules = {
  reviewers: 1,
  programManagerOn: {
    terms: true,
    limit: true,
    operatingPointState: true,
    finish: true,
    allocations: true,
    addOrRetire: true,
    gradeSteps: 2,
    measuredGrade: true,
    releasedGrowthPercent: 1,
    windowDays: 30,
    rangeCaution: true,
    predictedRisePercent: 1,
    standingWorse: true,
  },
};

import { z } from "zod";
import { MATURITY_GRADES, type MaturityGrade } from "@/lib/vocabulary/grades";
import { DEFAULT_REVIEW_RULES, type ReviewRules } from "@/lib/vocabulary/review-rules";
import { fractionNumber, nonNegativeNumber, positiveQuantity } from "./quantity";
import { calendarDate, hundredths, lineNumber } from "./text-schemas";

/** The number of the one terms line of a product. */
export const TERMS_NUMBER = "TM";

export const DEFAULT_GROWTH_TABLE: Record<MaturityGrade, number> = {
  estimated: 0.2,
  layout: 0.15,
  preliminary: 0.1,
  released: 0.05,
  measured_like_part: 0.03,
  measured_actual: 0,
};

const yesNo = z.boolean("Say yes or no.");
const percent = nonNegativeNumber.max(100, "At most 100 %.");

export const ReviewRulesBody = z.strictObject({
  reviewers: z.int("Give a whole number.").min(1, "Never fewer than one independent reviewer.").max(5, "At most five."),
  programManagerOn: z.strictObject({
    terms: yesNo,
    limit: yesNo,
    operatingPointState: yesNo,
    finish: yesNo,
    allocations: yesNo,
    addOrRetire: yesNo,
    gradeSteps: z.int("Give a whole number of steps.").min(1, "At least one step.").max(6, "At most six steps."),
    measuredGrade: yesNo.default(true),
    releasedGrowthPercent: percent,
    windowDays: z.int("Give a whole number of days.").min(1, "At least one day.").max(366, "At most 366 days."),
    rangeCaution: yesNo,
    predictedRisePercent: percent,
    standingWorse: yesNo,
  }),
}) satisfies z.ZodType<ReviewRules>;

const ReserveRow = z.strictObject({
  operatingPoint: lineNumber,
  hundredths: hundredths.min(0, "Must be 0 or greater."),
});

const ProfileRow = z.strictObject({
  date: calendarDate,
  predictedHundredths: hundredths,
  toleranceHundredths: hundredths.min(0, "Must be 0 or greater."),
});

export const TermsBody = z
  .strictObject({
    referenceOperatingPoint: lineNumber,
    /** At other points than those named the reserve scales with the limit. */
    reserves: z.array(ReserveRow).max(100),
    growthTable: z.record(z.enum(MATURITY_GRADES), fractionNumber),
    countSize: z.union([z.literal(0.001), z.literal(0.0001)], "Choose 0.001 or 0.0001."),
    referenceArea: positiveQuantity.nullable().default(null),
    flowArea: positiveQuantity.nullable().default(null),
    plannedProfile: z.array(ProfileRow).max(100).default([]),
    evidenceAgeDays: z.int("Give a whole number of days.").min(1, "At least one day.").max(36500).default(1095),
    rollUpVersion: z.int().positive().default(1),
    uncertaintyVersion: z.int().positive().default(1),
    timeZone: z.string().refine(isTimeZone, "Name a time zone such as Europe/Amsterdam.").default("UTC"),
    reviewRules: ReviewRulesBody.default(DEFAULT_REVIEW_RULES),
  })
  .superRefine((body, context) => {
    const points = body.reserves.map((row) => row.operatingPoint);
    if (!points.includes(body.referenceOperatingPoint)) {
      const message = "The reference operating point needs a reserve; it may be 0.";
      context.addIssue({ code: "custom", path: ["reserves"], message });
    }
    if (new Set(points).size !== points.length) {
      context.addIssue({ code: "custom", path: ["reserves"], message: "An operating point is named twice." });
    }
  });
export type TermsBody = z.output<typeof TermsBody>;

function isTimeZone(name: string): boolean {
  try {
    return new Intl.DateTimeFormat("en", { timeZone: name }).resolvedOptions().timeZone !== "";
  } catch (fault) {
    if (fault instanceof RangeError) return false;
    throw fault;
  }
}

export interface FirstTerms {
  referenceOperatingPoint: string;
  reserveHundredths: number;
}

/** What establishing starts from; every field can be changed before it is signed. */
export function newTerms({ referenceOperatingPoint, reserveHundredths }: FirstTerms): TermsBody {
  return {
    referenceOperatingPoint,
    reserves: [{ operatingPoint: referenceOperatingPoint, hundredths: reserveHundredths }],
    growthTable: DEFAULT_GROWTH_TABLE,
    countSize: 0.001,
    referenceArea: null,
    flowArea: null,
    plannedProfile: [],
    evidenceAgeDays: 1095,
    rollUpVersion: 1,
    uncertaintyVersion: 1,
    timeZone: "UTC",
    reviewRules: DEFAULT_REVIEW_RULES,
  };
}

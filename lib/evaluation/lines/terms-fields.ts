import { MATURITY_GRADES, MATURITY_GRADE_NAMES } from "@/lib/vocabulary/grades";
import type { FieldSpec } from "./field-spec";

const PROGRAM_MANAGER_FIELDS: readonly FieldSpec[] = [
  { key: "terms", label: "Any change of the terms", type: { type: "yes-no" } },
  { key: "limit", label: "A change of a limit", type: { type: "yes-no" } },
  { key: "operatingPointState", label: "A change of an operating point's state", type: { type: "yes-no" } },
  { key: "finish", label: "A change of a finish", type: { type: "yes-no" } },
  { key: "allocations", label: "A change of allocations", type: { type: "yes-no" } },
  { key: "addOrRetire", label: "Adding or retiring an item", type: { type: "yes-no" } },
  { key: "gradeSteps", label: "A grade raised by so many steps", type: { type: "number", whole: true } },
  { key: "measuredGrade", label: "A grade raised to a measured one", type: { type: "yes-no" } },
  {
    key: "releasedGrowthPercent",
    label: "Growth released within the window, of the limit",
    type: { type: "number", unit: "%" },
  },
  { key: "windowDays", label: "The window", type: { type: "number", whole: true, unit: "days" } },
  { key: "rangeCaution", label: "A new range caution", type: { type: "yes-no" } },
  {
    key: "predictedRisePercent",
    label: "A rise of the predicted total, of the limit",
    type: { type: "number", unit: "%" },
  },
  { key: "standingWorse", label: "A worse standing", type: { type: "yes-no" } },
];

const REVIEW_RULES_FIELDS: readonly FieldSpec[] = [
  {
    key: "reviewers",
    label: "Independent reviewers",
    help: "Never fewer than one.",
    type: { type: "number", whole: true },
  },
  {
    key: "programManagerOn",
    label: "A program manager signs too on",
    type: { type: "record", of: PROGRAM_MANAGER_FIELDS },
  },
];

const RESERVE_COLUMNS: readonly FieldSpec[] = [
  { key: "operatingPoint", label: "Operating point", type: { type: "reference", to: "operating_point" } },
  { key: "hundredths", label: "Reserve", type: { type: "newtons" } },
];

const PROFILE_COLUMNS: readonly FieldSpec[] = [
  { key: "date", label: "Date", type: { type: "date" } },
  { key: "predictedHundredths", label: "Predicted", type: { type: "newtons" } },
  { key: "toleranceHundredths", label: "Tolerance", type: { type: "newtons" } },
];

export const TERMS_FIELDS: readonly FieldSpec[] = [
  {
    key: "referenceOperatingPoint",
    label: "Reference operating point",
    help: "Limit, reserve and allocations are kept there.",
    type: { type: "reference", to: "operating_point" },
  },
  {
    key: "reserves",
    label: "Reserve",
    help: "At an operating point that is not named here the reserve scales with the limit.",
    type: { type: "list", entry: "Reserve at", of: RESERVE_COLUMNS, keyedBy: ["operatingPoint"] },
  },
  {
    key: "growthTable",
    label: "Growth allowance",
    help: "Of the basic estimate, by maturity grade.",
    type: {
      type: "record",
      of: MATURITY_GRADES.map((key) => ({ key, label: MATURITY_GRADE_NAMES[key], type: { type: "fraction" } })),
    },
  },
  {
    key: "countSize",
    label: "Size of a drag count",
    type: {
      type: "number-choice",
      choices: [
        { value: 0.001, label: "0.001 (road vehicles)" },
        { value: 0.0001, label: "0.0001 (aircraft)" },
      ],
    },
  },
  {
    key: "referenceArea",
    label: "Reference area",
    help: "For coefficients and counts; they are not shown without one.",
    symbol: "A_ref",
    type: { type: "quantity", dimension: "area" },
    optional: true,
  },
  {
    key: "flowArea",
    label: "Flow area",
    help: "Of a duct: pressure losses are turned into forces on it, so that pascals add up.",
    symbol: "A_flow",
    type: { type: "quantity", dimension: "area" },
    optional: true,
  },
  {
    key: "plannedProfile",
    label: "Planned profile",
    help: "Where the predicted total is meant to stand, and when.",
    type: { type: "list", entry: "Planned on", of: PROFILE_COLUMNS, keyedBy: ["date"] },
    optional: true,
  },
  {
    key: "evidenceAgeDays",
    label: "Evidence counts as old after",
    type: { type: "number", whole: true, unit: "days" },
  },
  { key: "rollUpVersion", label: "Version of the roll-up", type: { type: "number", whole: true }, fixed: true },
  {
    key: "uncertaintyVersion",
    label: "Version of the uncertainty",
    type: { type: "number", whole: true },
    fixed: true,
  },
  { key: "timeZone", label: "Time zone", help: "Days begin there.", type: { type: "text", longest: 60 } },
  { key: "reviewRules", label: "Review rules", type: { type: "record", of: REVIEW_RULES_FIELDS } },
];

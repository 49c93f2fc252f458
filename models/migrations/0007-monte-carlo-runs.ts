import { appendOnly, isHash, isTime, refuseInsert, type Migration } from "./migration";

const GREATEST_SEED = Number.MAX_SAFE_INTEGER;

export const monteCarloRuns: Migration = {
  name: "0007-monte-carlo-runs",
  statements: [
    `CREATE TABLE monte_carlo_runs (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      product_id INTEGER NOT NULL,
      issue INTEGER NOT NULL,
      operating_point_id INTEGER NOT NULL,
      seed INTEGER NOT NULL CHECK (seed BETWEEN 0 AND ${GREATEST_SEED}),
      draws INTEGER NOT NULL CHECK (draws > 0),
      recipe TEXT NOT NULL CHECK (length(recipe) > 0),
      input_hash TEXT NOT NULL CHECK (${isHash("input_hash")}),
      result TEXT NOT NULL CHECK (json_valid(result)),
      result_hash TEXT NOT NULL CHECK (${isHash("result_hash")}),
      asked_by_id INTEGER NOT NULL REFERENCES users (id),
      printed_name TEXT NOT NULL,
      ran_at TEXT NOT NULL CHECK (${isTime("ran_at")}),
      UNIQUE (product_id, issue, operating_point_id, seed, draws, recipe),
      FOREIGN KEY (operating_point_id, product_id) REFERENCES lines (id, product_id),
      FOREIGN KEY (product_id, issue) REFERENCES issues (product_id, number)
    ) STRICT`,
    refuseInsert(
      "monte_carlo_runs",
      "of_a_point",
      "NOT EXISTS (SELECT 1 FROM lines WHERE id = NEW.operating_point_id AND kind = 'operating_point')",
      "monte_carlo_runs: drawn at an operating point",
    ),
    ...appendOnly("monte_carlo_runs"),
  ],
};

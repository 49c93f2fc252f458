/** One line of a hand calculation. */
export interface WorkedStep {
  quantity: string;
  symbol: string;
  formula: string;
  withValues: string;
  value: number;
  unit: string;
  source?: string;
  range?: string;
}

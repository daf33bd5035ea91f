/** Ridge-penalised logistic regression with bounds on the signs of weights: iterated least squares, each solved by coordinate descent. */
export interface LogisticFit {
  base: number;
  weights: number[];
}

export interface LogisticOptions {
  /** Penalty on the squared weight of each feature once scaled to unit deviation, per unit of total sample weight. */
  ridge: number;
  /** −1, 0 or 1 per feature: weights of the other sign are not allowed; 0 = free. */
  signs?: readonly number[];
  /** Known part of the logit of each row. */
  offsets?: readonly number[];
}

export const logistic = (logit: number): number => 1 / (1 + Math.exp(-logit));

/**
 * @param rows features per row @param happened the event per row @param sampleWeights importance per row
 * @returns base and weights for the features as given (unscaled)
 */
export function fitLogistic(rows: readonly ArrayLike<number>[], happened: readonly boolean[], sampleWeights: readonly number[], options: LogisticOptions): LogisticFit {
  const width = rows[0]?.length ?? 0;
  const total = sampleWeights.reduce((sum, weight) => sum + weight, 0);
  const scaled: Float64Array[] = [];
  const centre: number[] = [];
  const spread: number[] = [];
  for (let f = 0; f < width; f += 1) {
    const middle = rows.reduce((sum, row, r) => sum + sampleWeights[r]! * row[f]!, 0) / total;
    const deviation = Math.sqrt(rows.reduce((sum, row, r) => sum + sampleWeights[r]! * (row[f]! - middle) ** 2, 0) / total) || 1;
    centre.push(middle);
    spread.push(deviation);
    scaled.push(Float64Array.from(rows, (row) => (row[f]! - middle) / deviation));
  }
  const beta = new Float64Array(width);
  let base = 0;
  const penalty = options.ridge * total;
  for (let round = 0; round < 40; round += 1) {
    const logits = Float64Array.from(rows, (_, r) => base + (options.offsets?.[r] ?? 0) + scaled.reduce((sum, column, f) => sum + column[r]! * beta[f]!, 0));
    const curvature = Float64Array.from(logits, (logit, r) => sampleWeights[r]! * Math.max(1e-4, logistic(logit) * (1 - logistic(logit))));
    // Working residual: what is still to be explained, on the logit.
    const residual = Float64Array.from(logits, (logit, r) => (sampleWeights[r]! * ((happened[r] ? 1 : 0) - logistic(logit))) / curvature[r]!);
    const before = [base, ...beta];
    const curvatureSum = curvature.reduce((sum, value) => sum + value, 0);
    const squares = scaled.map((column) => column.reduce((sum, value, r) => sum + curvature[r]! * value * value, 0));
    for (let sweep = 0; sweep < 60; sweep += 1) {
      let most = 0;
      const step = residual.reduce((sum, value, r) => sum + curvature[r]! * value, 0) / curvatureSum;
      base += step;
      for (let r = 0; r < residual.length; r += 1) residual[r] = residual[r]! - step;
      for (let f = 0; f < width; f += 1) {
        const column = scaled[f]!;
        let slope = 0;
        for (let r = 0; r < residual.length; r += 1) slope += curvature[r]! * residual[r]! * column[r]!;
        const free = (slope + squares[f]! * beta[f]!) / (squares[f]! + penalty);
        const sign = options.signs?.[f] ?? 0;
        const next = sign > 0 ? Math.max(0, free) : sign < 0 ? Math.min(0, free) : free;
        const change = next - beta[f]!;
        if (change === 0) continue;
        beta[f] = next;
        most = Math.max(most, Math.abs(change));
        for (let r = 0; r < residual.length; r += 1) residual[r] = residual[r]! - change * column[r]!;
      }
      if (most < 1e-5) break;
    }
    if ([base, ...beta].every((value, i) => Math.abs(value - before[i]!) < 1e-4)) break;
  }
  const weights = Array.from(beta, (value, f) => value / spread[f]!);
  return { base: base - weights.reduce((sum, weight, f) => sum + weight * centre[f]!, 0), weights };
}

/** What the workings sheet says: titles, labels and one line of explanation beside each step. */
export const workingsWords = {
  title: (what: string): string => `Workings: ${what}`,
  law: (law: string): string => `Law: ${law}`,
  form: (plot: string, against: string): string => `Straight form: ${plot} against ${against}`,
  recalculates: (): string =>
    'Ordinary spreadsheet formulas only: this sheet recalculates in any spreadsheet, without the add-in. Columns F onwards hold the readings.',

  headers: (): readonly string[] => ['step', 'value', 'how', 'digits'],
  column: (letters: string): string => `column ${letters}`,
  given: (): string => 'Given',
  coverage: (): string => 'coverage probability',
  coverageHow: (): string => 'The probability that the intervals below are to cover.',
  known: (name: string): string => name,
  knownHow: (name: string): string => `Known constant ${name}, as stated.`,
  builtInHow: (name: string): string => `${name} is built into the law.`,
  knownUncertainty: (name: string): string => `u(${name})`,
  knownUncertaintyHow: (name: string): string => `Standard uncertainty of ${name}, as stated.`,
  spread: (symbol: string): string => `u(${symbol})`,
  spreadAbsolute: (symbol: string): string => `Standard uncertainty of every ${symbol}, as stated.`,
  spreadRelative: (symbol: string): string =>
    `Standard uncertainty as a fraction of each ${symbol}, as stated.`,

  readings: (): string => 'Readings',
  axes: (): string => 'On the straight axes',
  position: (): string => 'no.',
  predictorHow: (symbol: string): string =>
    `${symbol}, copied by reference; empty where the pair of cells is not a reading.`,
  responseHow: (symbol: string): string => `${symbol}, copied by reference.`,
  onLine: (): string => 'in use',
  onLineHow: (): string => '1 for a reading in use, 0 for a pair of cells that is none.',
  onLineDomainHow: (): string =>
    '1 for a reading on the line, 0 where the axes do not exist or there is no reading.',
  taking: (): string => 'in fit',
  takingHow: (): string => '1 for a reading that takes part in the fit of the curve, 0 otherwise.',
  vertical: (text: string): string => `Y = ${text}`,
  verticalHow: (text: string): string => `Vertical straight axis, Y = ${text}.`,
  horizontal: (text: string): string => `X = ${text}`,
  horizontalHow: (text: string): string => `Horizontal straight axis, X = ${text}.`,
  ownUncertainty: (symbol: string): string => `u(${symbol})`,
  ownUncertaintyHow: (symbol: string): string => `Standard uncertainty of ${symbol}.`,
  derivative: (of: string, by: string): string => `∂${of}/∂${by}`,
  derivativeHow: (of: string, by: string): string =>
    `Derivative of ${of} by ${by} at the reading: how far ${of} moves when ${by} does.`,
  weight: (): string => 'w',
  weightOneHow: (): string => 'Weight: all readings count the same.',
  weightEqualHow: (symbol: string): string =>
    `Weight 1/(∂Y/∂${symbol})²: the same scatter in ${symbol} for every reading.`,
  weightProportionalHow: (symbol: string): string =>
    `Weight 1/(${symbol}·∂Y/∂${symbol})²: scatter in proportion to ${symbol}.`,
  weightKnownHow: (symbol: string): string => `Weight 1/(u(${symbol})·∂Y/∂${symbol})².`,

  sums: (): string => 'Sums',
  count: (): string => 'n',
  countHow: (): string => 'Number of readings in use.',
  totalWeightHow: (): string => 'Sum of the weights.',
  meanHow: (axis: string): string => `Weighted mean of ${axis}.`,
  deviationHow: (axis: string): string => `${axis} less its mean.`,
  sumHow: (of: string): string => `Sum of ${of} over the readings.`,

  line: (): string => 'The line Y = intercept + slope·X',
  slope: (): string => 'slope',
  slopeHow: (): string => 'Σ w (X − X̄)(Y − Ȳ) / Σ w (X − X̄)²: weighted least squares.',
  intercept: (): string => 'intercept',
  interceptHow: (): string => 'Ȳ − slope·X̄: the line passes through the mean point.',
  heldHow: (text: string): string => `Held at the value that the known constants give it: ${text}.`,
  absentHow: (): readonly string[] => ['The form has no intercept: the line passes through the origin.'],
  slopeHeldHow: (): string => 'Σ w X (Y − intercept) / Σ w X²: least squares with the intercept held.',
  slopeOriginHow: (): string => 'Σ w X Y / Σ w X²: least squares through the origin.',
  residual: (): string => 'r',
  residualHow: (): string => 'Residual: Y less the line.',
  freedom: (): string => 'degrees of freedom ν',
  freedomHow: (terms: number): string => `n − ${terms}: readings less terms of the line that were fitted.`,
  freedomDirectHow: (constants: number): string =>
    `n − ${constants}: readings less constants that were fitted.`,
  scale: (): string => 's²',
  scaleEstimatedHow: (): string => 'Scale of the scatter, Σ w r² / ν.',
  scaleKnownHow: (): string => '1: the uncertainties of the readings are known and taken as they are.',
  varianceSlope: (): string => 'u²(slope)',
  varianceSlopeHow: (): string => 's² / Σ w (X − X̄)².',
  varianceSlopeOneHow: (): string => 's² / Σ w X².',
  varianceInterceptHow: (): string => 's² (1/Σ w + X̄² / Σ w (X − X̄)²).',
  varianceIntercept: (): string => 'u²(intercept)',
  covariance: (): string => 'u(intercept, slope)',
  covarianceHow: (): string => 'Covariance of intercept and slope, −s² X̄ / Σ w (X − X̄)².',
  correlation: (): string => 'correlation of the two',
  correlationHow: (): string => 'u(intercept, slope) / (u(intercept)·u(slope)).',
  standardUncertainty: (name: string): string => `u(${name})`,
  rootHow: (of: string): string => `Standard uncertainty: the square root of ${of}.`,
  heldVarianceHow: (): string =>
    'What the intercept inherits from the uncertain known constants: Σ (∂intercept/∂known · u(known))².',
  heldSlopeHow: (): string => 's² / Σ w X² + (Σ w X / Σ w X²)² u²(intercept)',
  heldSlopeBothHow: (): string => 'u²(slope) + (Σ w β / Σ w β²)² u²(intercept)',
  noFreedom: (): readonly string[] => [
    'As many readings as fitted terms: nothing is left to judge scatter by, so there are no uncertainties.',
  ],

  bothAxes: (): string => 'The line, errors on both axes: final iteration',
  bothAxesHow: (): readonly string[] => [
    'The slope stands in the weights of its own sums, so it is found by iteration.',
    'Shown are the sums of the last round.',
  ],
  slopeIn: (): string => 'slope of the round before',
  slopeInHow: (): string => 'Where the iteration had arrived: a number, carried over.',

  weightBothHow: (): string =>
    'Weight 1/(u²(Y) + slope² u²(X) − 2 slope u(X, Y)), with the slope of the round before.',
  betaHow: (): string =>
    'How far the adjusted point lies from the mean along X: w (U u²(Y) + slope V u²(X) − (slope U + V) u(X, Y)), U and V the deviations.',
  slopeBothHow: (): string =>
    'Σ w β V / Σ w β U (York et al. 2004, eq. 13); the same as before when settled.',
  varianceAxisHow: (axis: string): string =>
    `Variance of ${axis} from the uncertainties of the reading, to first order.`,
  covarianceAxesHow: (): string => 'Covariance of X and Y, because both may depend on the same reading.',
  varianceSlopeBothHow: (): string => '1 over the weighted spread of the adjusted points.',
  varianceInterceptBothHow: (): string => '1/Σ w + (X̄ + β̄)² u²(slope).',
  covarianceBothHow: (): string => '−(X̄ + β̄) u²(slope).',

  factor: (): string => 'coverage factor',
  factorStart: (): string => 'factor by the inverse function',
  factorNormalHow: (): string =>
    'From the normal distribution, because the uncertainties of the readings are known.',
  factorStudentHow: (): string =>
    'From Student’s t distribution with ν degrees of freedom, both tails together.',
  angleHow: (): string =>
    'The angle whose tangent is factor/√ν: Student’s distribution is written out in it.',
  studentTerms: (): string => 't term',
  studentTermsHow: (): string =>
    'Terms of Student’s distribution for ν degrees of freedom (Abramowitz & Stegun 26.7.3–4).',
  studentWithin: (): string => 'probability within ± factor',
  studentWithinHow: (): string =>
    'For even ν sin θ times the sum of these terms, for odd ν 2/π (θ + sin θ times the sum).',
  factorPolishHow: (): string =>
    'One Newton step: the inverse function of some spreadsheets stops after nine digits.',

  constants: (): string => 'Constants of the law',
  solvedHow: (name: string, text: string): string => `${name} = ${text}.`,
  startHow: (name: string): string =>
    `There is no closed form for ${name}: where its search had arrived, a number carried over.`,
  combinedHow: (name: string): string =>
    `${name} stands in both terms: least squares over both, from where its search had arrived (a number carried over).`,
  stepTo: (name: string): string => `step of ${name}`,
  stepHow: (): string => 'One more Newton step; it vanishes when the search had settled.',
  steppedHow: (name: string): string => `${name} with this step taken.`,
  byTerm: (of: string, by: string): string => `∂${of}/∂${by}`,
  termByHow: (term: string, name: string): string => `Derivative of the ${term}’s expression by ${name}.`,
  determinant: (): string => 'determinant',
  determinantHow: (): string => 'Of the four derivatives: both terms together settle both constants.',
  determinantCombinedHow: (): string =>
    'Σ w (∂slope)² about the mean plus Σ w (∂line at the mean)²: both terms weigh in by their covariance.',
  constantByHow: (name: string, term: string): string =>
    `How ${name} follows the ${term}: from the inverse of these derivatives.`,
  propagated: (name: string, term: string): string => `(∂${name}/∂${term})² u²(${term})`,
  propagatedBoth: (name: string): string => `2 (∂${name}/∂slope)(∂${name}/∂intercept) u(intercept, slope)`,
  propagatedKnown: (name: string, known: string): string => `(d${name}/d${known})² u²(${known})`,
  varianceConstantHow: (parts: readonly string[]): string => `Law of propagation: ${parts.join(' + ')}.`,
  low: (name: string): string => `${name} low`,
  high: (name: string): string => `${name} high`,
  plainEndHow: (sign: '−' | '+', name: string): string => `${name} ${sign} factor·u(${name}).`,
  end: (name: string, sign: '−' | '+'): string => `${name} at ${sign} end`,
  endHow: (term: string, sign: '−' | '+'): string =>
    `The same solution with ${term} ${sign} factor·u(${term}) in place of the ${term}.`,
  carriedEndHow: (source: string, name: string): string =>
    `The interval of ${source} carried through: ${name} depends on ${source} alone.`,
  ofTerm: (term: string): string => `the ${term}`,
  derivedHow: (name: string, text: string): string => `${name} = ${text}.`,
  derivedUncertaintyHow: (name: string, from: string): string => `|d(${name})/d${from}|·u(${from}).`,
  sampledNote: (): readonly string[] => [
    'The live intervals are drawn by chance (interval=montecarlo), which no plain formula repeats.',
    'Above are value ± factor·u; only values and standard uncertainties are compared.',
  ],

  knownEffect: (name: string): string => `Effect of ${name}`,
  axisByKnownHow: (axis: string, name: string): string => `Derivative of ${axis} by ${name}, at the reading.`,
  weightByKnownHow: (name: string): string => `How the weight follows ${name}.`,
  pulledHow: (name: string): string =>
    `w (∂Y/∂${name} − slope ∂X/∂${name}) + r ∂w/∂${name}: how the reading pulls at the line when ${name} changes.`,
  slopeByKnownHow: (name: string): string => `How the slope follows ${name} when the line is fitted anew.`,
  interceptByKnownHow: (name: string): string =>
    `How the intercept follows ${name} when the line is fitted anew.`,
  totalHow: (name: string, known: string): string => `How ${name} follows ${known} in all.`,
  refittedHow: (name: string, known: string): string =>
    `How ${name} follows ${known}: found by fitting anew with ${known} shifted, a number carried over.`,

  direct: (): string => 'The curve, least squares in the units of y: final iteration',
  directHow: (): readonly string[] => [
    'The constants are found by iteration; shown are the sums of its last round.',
    'The constants that it arrived at are numbers, carried over.',
    'The step that these sums still ask for is next to nothing: the iteration had settled.',
  ],
  arrived: (name: string): string => `${name}, arrived at`,
  arrivedHow: (name: string): string => `${name}, where the iteration had arrived: a number carried over.`,
  fitted: (symbol: string): string => `fitted ${symbol}`,
  fittedHow: (symbol: string): string => `${symbol} from the law with these constants.`,
  rootWeight: (): string => '√ω',
  rootWeightHow: (symbol: string, kind: string): string =>
    kind === 'known'
      ? `1/u(${symbol}): what each residual is measured by.`
      : kind === 'proportional'
        ? `1/${symbol}: scatter in proportion to ${symbol}.`
        : 'Every residual counts the same.',
  weightedResidual: (): string => '√ω r',
  weightedResidualHow: (symbol: string): string => `Weighted residual, √ω (${symbol} − fitted).`,
  jacobianHow: (name: string, symbol: string): string =>
    `√ω times the derivative of the fitted ${symbol} by ${name}.`,
  orthogonal: (k: number): string => `q${k}`,
  orthogonalHow: (k: number): string =>
    k === 1
      ? 'The first of these columns, scaled to length 1.'
      : `What is left of column ${k}, scaled to length 1 (Gram–Schmidt).`,
  reduced: (k: number, j: number): string => `col. ${k} less q${j}`,
  reducedHow: (k: number, j: number): string => `Column ${k} with its share of q${j} taken out.`,
  overlap: (j: number, k: number): string => `r${j}${k}`,
  overlapHow: (j: number, k: number): string =>
    j === k ? `Length of column ${k} after its shares were taken out.` : `Share of q${j} in column ${k}.`,
  projection: (k: number): string => `z${k}`,
  projectionHow: (k: number): string => `Share of q${k} in the weighted residuals.`,
  lastStep: (name: string): string => `last step of ${name}`,
  lastStepHow: (): string => 'Back substitution; next to nothing when the iteration had settled.',
  settledHow: (name: string): string => `${name} with the last step taken.`,
  inverse: (j: number, k: number): string => `inverse of r, ${j}${k}`,
  inverseHow: (): string => 'Inverse of the triangle of lengths and shares.',
  squares: (): string => 'Σ ω r²',
  varianceDirect: (): string => 's² Σ (row of the inverse)²',

  straightness: (): string => 'How straight',
  rSquared: (): string => 'r squared',
  rSquaredHow: (): string => '1 − Σ w r² / Σ w (Y − Ȳ)².',
  rSquaredHeldHow: (): string => '1 − Σ w r² / Σ w Y².',
  deviation: (): string => 'residual standard deviation',
  deviationStraightHow: (): string => '√(Σ w r² / ν).',
  bowShapeHow: (): string => 'Parabola that is level over the readings: (X − X̄)² less its share of the line.',
  bowSkewHow: (): string => 'Share of the slope in the squares: Σ w (X − X̄)³ / Σ w (X − X̄)².',
  bowMeanHow: (): string => 'Share of the mean in the squares: Σ w (X − X̄)² / Σ w.',
  curvature: (): string => 'curvature c2',
  curvatureHow: (): string => 'Σ w p r / Σ w p²: coefficient of X² in a parabola with the same weights.',
  bow: (): string => 'bow %',
  bowHow: (): string =>
    '100·c2 (Xmax − Xmin)² / (4 |slope| (Xmax − Xmin)): sagitta as a share of the line’s rise.',

  comparison: (): string => 'Against the live function',
  agrees: (): readonly [string, string] => ['agrees to ', ' digits'],
  noLive: (): string => 'the add-in is not here: nothing to compare with',
  verdict: (): string => 'All of them',
  verdictAgrees: (): readonly [string, string] => [
    'The workings and the live function agree to ',
    ' digits.',
  ],
  verdictNone: (): string =>
    'The add-in is not here, so there is nothing to compare with. Every number above stands on its own.',
};

import { type ConstantSource, constantEstimates } from '../constants/estimates.ts';
import { knownEffectsOf } from '../constants/knownEffects.ts';
import { addKnown, covarianceFromReadings } from '../constants/propagate.ts';
import { coverageFactor } from '../distributions/coverageFactor.ts';
import type { FitSettings } from '../given/given.ts';
import { compileLaw } from '../law/compileLaw.ts';
import type { Law, StraightForm } from '../law/law.ts';
import type { Line } from '../line/line.ts';
import { Problem } from '../problem.ts';
import type { Readings, SetAside } from '../readings/readings.ts';
import { fitWords } from '../words/fitWords.ts';
import { givenConstants } from './columns.ts';
import { type DrawnLine, drawLine, outsideAxis } from './drawLine.ts';
import type {
  ConstantEstimate,
  Coverage,
  DirectResult,
  Fit,
  FitState,
  KnownEffect,
  LeftoverTerm,
  StraightAxes,
} from './fit.ts';
import { type FitTask, fitTask, takingPart } from './fitTask.ts';
import { leftoverTerm } from './leftoverTerm.ts';
import { type Settled, settle } from './settle.ts';
import { scaleOf } from './spread.ts';

/**
 * Fits a law to readings: straightens it, fits the line, and turns slope and intercept into the law's constants; laws
 * with trial constants, and `fit=direct`, settle them by least squares in the units of y.
 * @param readings complete readings, n
 * @param law catalogue name or equation
 * @param settings known constants, uncertainties of the readings, options
 * @throws Problem with the codes of `compileLaw`, and `tooFew`, `domain`, `undefined`, `noConvergence`, `argument`
 */
export function fitLaw(readings: Readings, law: string, settings: FitSettings): Fit {
  return fitCompiled(readings, compileLaw(law, settings.known.keys()), settings);
}

/** As `fitLaw`, for a law that is compiled with the names of the known constants. */
export function fitCompiled(readings: Readings, law: Law, settings: FitSettings): Fit {
  const { taking, setAside } = takingPart(readings, settings);
  const task = fitTask(law, readings, taking, settings);
  const settled = settle(task, givenConstants(law, settings.known));
  return new FittedLaw(readings, task, settled, taking, [...readings.setAside, ...setAside]);
}

/** A fit whose uncertainties are worked out when they are first asked for. */
class FittedLaw implements Fit {
  readonly readings: Readings;
  readonly taking: Int32Array;
  private readonly task: FitTask;
  private readonly settled: Settled;
  private readonly excluded: readonly SetAside[];
  private readonly remembered = new Map<string, unknown>();

  constructor(
    readings: Readings,
    task: FitTask,
    settled: Settled,
    taking: Int32Array,
    excluded: readonly SetAside[],
  ) {
    this.readings = readings;
    this.task = task;
    this.settled = settled;
    this.taking = taking;
    this.excluded = excluded;
  }

  get law(): Law {
    return this.task.law;
  }

  get form(): StraightForm {
    return this.task.form;
  }

  get settings(): FitSettings {
    return this.task.settings;
  }

  get values(): Float64Array {
    return this.settled.values;
  }

  get direct(): DirectResult | null {
    return this.settled.direct;
  }

  get axes(): StraightAxes {
    return this.settled.drawn().axes;
  }

  get used(): Int32Array {
    const { used } = this.settled.drawn();
    if (used.length === this.taking.length) return this.taking;
    return this.once('used', () => used.map((i) => this.taking[i] ?? 0));
  }

  get setAside(): readonly SetAside[] {
    return this.once('setAside', () => [...this.excluded, ...this.outsideLine()].sort(byPosition));
  }

  get line(): Line {
    return this.once('line', () => this.lineToShow());
  }

  get lineFromReadings(): Line {
    return this.settled.drawn().line;
  }

  get coverage(): Coverage {
    return this.once('coverage', () => {
      const probability = this.settings.options.coverage;
      const degreesOfFreedom = this.direct?.degreesOfFreedom ?? this.settled.drawn().line.degreesOfFreedom;
      const distribution = scaleOf(this.settings.spreadY) === 'known' ? 'normal' : 't';
      const factor =
        degreesOfFreedom > 0 ? coverageFactor(probability, distribution, degreesOfFreedom) : Number.NaN;
      return { probability, factor, distribution, degreesOfFreedom };
    });
  }

  get knownEffects(): readonly KnownEffect[] {
    return this.once('knownEffects', () => {
      const { law } = this;
      return knownEffectsOf(this.settings.known, (name, value) => {
        const shifted = givenConstants(law, this.settings.known);
        shifted[law.constants.indexOf(name)] = value;
        return stateOf(settle(this.task, shifted, this.values));
      });
    });
  }

  get covarianceFromReadings(): readonly Float64Array[] {
    return this.once('covarianceFromReadings', () => covarianceFromReadings(this.source()));
  }

  get covariance(): readonly Float64Array[] {
    return this.once('covariance', () => addKnown(this.law, this.covarianceFromReadings, this.knownEffects));
  }

  get constants(): readonly ConstantEstimate[] {
    return this.once('constants', () => constantEstimates(this.source(), this));
  }

  get leftover(): LeftoverTerm | null {
    return this.once('leftover', () => leftoverTerm(this.source(), this));
  }

  private source(): ConstantSource {
    return { task: this.task, settled: this.settled };
  }

  private once<T>(name: string, compute: () => T): T {
    // Each name is used with one type only.
    if (!this.remembered.has(name)) this.remembered.set(name, compute());
    return this.remembered.get(name) as T;
  }

  /** The line as it is shown: a held intercept with what it inherits, nothing uncertain without degrees of freedom. */
  private lineToShow(): Line {
    const { line } = this.settled.drawn();
    const inherits =
      this.settings.options.intercept === 'held' &&
      !this.form.proportional &&
      [...this.settings.known.values()].some(({ standardUncertainty }) => standardUncertainty > 0);
    if (!inherits) return line;
    return drawLine(this.task, this.values, false, true).line;
  }

  private outsideLine(): SetAside[] {
    const drawn = this.drawnOrNull();
    if (drawn === null || drawn.outside.length === 0) return [];
    const { x, y, position, form } = this.task;
    const inputs = [x, y, ...this.values];
    const vertical = form.vertical.evaluate(inputs, x.length);
    return Array.from(drawn.outside, (i) => {
      const at = position[i] ?? 0;
      const axis = outsideAxis(this.task, vertical, i);
      const message =
        this.direct === null
          ? fitWords.outsideAside(at, x[i] ?? 0, y[i] ?? 0, axis)
          : fitWords.outsideLine(at, axis);
      return { position: at, reason: 'outsideDomain', message };
    });
  }

  private drawnOrNull(): DrawnLine | null {
    if (this.direct === null) return this.settled.drawn();
    try {
      return this.settled.drawn();
    } catch (error) {
      // A direct fit may stand without a line; whoever asks for the line itself is told why there is none.
      if (error instanceof Problem) return null;
      throw error;
    }
  }
}

function byPosition(a: SetAside, b: SetAside): number {
  return a.position - b.position;
}

function stateOf(settled: Settled): FitState {
  const { values, direct } = settled;
  if (direct !== null) return { values, slope: Number.NaN, intercept: Number.NaN };
  const { line } = settled.drawn();
  return { values, slope: line.slope, intercept: line.intercept };
}

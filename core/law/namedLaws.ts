import type { CautionWord } from '../words/cautionWords.ts';
import type { DerivedConstant } from './law.ts';

/** A law that can be asked for by name. */
export interface NamedLaw {
  readonly name: string;
  readonly equation: string;
  /** One sentence: where the law is met. */
  readonly use: string;
  /** True for the two-constant laws that readings of unknown origin are compared with. */
  readonly general: boolean;
  /** Constants with a value of their own unless one is given. */
  readonly builtIn: ReadonlyMap<string, number>;
  readonly derived: readonly DerivedConstant[];
  /** What a reader must be warned of before relying on the law. */
  readonly caution: CautionWord | null;
}

/** Molar gas constant in J/(mol K), exact in the SI since 2019. */
export const GAS_CONSTANT = 8.314462618;
/** 25 °C in K, the reference temperature of thermistor data sheets. */
const REFERENCE_TEMPERATURE = 298.15;

/** factor/constant, where the constant has the sign of `factor`. */
function factorOver(name: string, from: string, factor: number): DerivedConstant {
  const exists = (constant: number): boolean => constant * factor > 0;
  return {
    name,
    from,
    value: (constant) => (exists(constant) ? factor / constant : Number.NaN),
    slope: (constant) => (exists(constant) ? -factor / constant ** 2 : Number.NaN),
  };
}

type Details = Partial<Pick<NamedLaw, 'builtIn' | 'derived' | 'caution'>>;

function law(general: boolean, name: string, equation: string, use: string, details: Details = {}): NamedLaw {
  return { name, equation, use, general, builtIn: new Map(), derived: [], caution: null, ...details };
}

const general = (name: string, equation: string, use: string, details?: Details): NamedLaw =>
  law(true, name, equation, use, details);
const trade = (name: string, equation: string, use: string, details?: Details): NamedLaw =>
  law(false, name, equation, use, details);

/** The catalogue: general laws first, then named laws of the trade. */
export const namedLaws: readonly NamedLaw[] = [
  general('straight line', 'y(x) = a + b*x', 'Anything that grows by the same amount for every unit of x.'),
  general('power', 'y(x) = p*x^q', 'Scaling: flow over a weir, drag against speed, size against weight.'),
  general(
    'exponential',
    'y(x) = p*exp(q*x)',
    'Growth or decay in proportion to what is there: discharge, absorption, populations.',
    {
      derived: [
        factorOver('time constant', 'q', -1),
        factorOver('half-life', 'q', -Math.LN2),
        factorOver('doubling time', 'q', Math.LN2),
      ],
    },
  ),
  general(
    'logarithmic',
    'y(x) = a + b*ln(x)',
    'Equal steps for equal ratios of x: wind profiles, electrodes, learning.',
  ),
  general('reciprocal', 'y(x) = 1/(a + b*x)', 'A rate that falls as one over a growing resistance.'),
  general(
    'saturation',
    'y(x) = p*x/(q + x)',
    'Enzymes, uptake and growth that level off at p, half of it at q.',
  ),
  general('hyperbolic', 'y(x) = a + b/x', 'A part that dilutes as one over x on top of a constant part.'),
  general(
    'root',
    'y(x) = a + b*sqrt(x)',
    'Diffusion and absorption against time; flow against pressure drop.',
  ),
  general('square', 'y(x) = a + b*x^2', 'Losses against flow or current; distance against time from rest.'),
  general(
    'inverse exponential',
    'y(x) = p*exp(q/x)',
    'Vapour pressure, viscosity and rates against absolute temperature.',
  ),
  general(
    'rise and decay',
    'y(x) = p*x*exp(q*x)',
    'A response that rises in proportion to x and then dies away.',
  ),

  trade('proportional', 'y(x) = b*x', 'One constant, through the origin: a spring, a shunt, a dilution.'),
  trade(
    'arrhenius',
    'k(T) = A*exp(-Ea/(Rgas*T))',
    'Rate constant against temperature in kelvin; Ea in J/mol.',
    {
      builtIn: new Map([['Rgas', GAS_CONSTANT]]),
      caution: 'heat',
    },
  ),
  trade(
    'thermistor',
    'R(T) = R0*exp(B*(1/T - 1/T0))',
    'Resistance of an NTC thermistor; temperatures in kelvin.',
    {
      builtIn: new Map([['T0', REFERENCE_TEMPERATURE]]),
    },
  ),
  trade(
    'first order',
    'C(t) = C0*exp(-k*t)',
    'Concentration in a reaction, or disinfectant in water, that decays in proportion to itself.',
    {
      derived: [factorOver('half-life', 'k', Math.LN2)],
      caution: 'drinkingWater',
    },
  ),
  trade('second order', 'C(t) = 1/(1/C0 + k*t)', 'Concentration in a reaction of two equal partners.', {
    caution: 'drinkingWater',
  }),
  trade(
    'approach',
    'y(t) = yf + (y0 - yf)*exp(-t/tau)',
    'Cooling, filling and settling from y0 towards yf.',
    { caution: 'storedEnergy' },
  ),
  trade(
    'saturating rise',
    'y(x) = m*(1 - exp(-k*x))',
    'A rise from zero that levels off at m: oxygen demand, charging.',
  ),
  trade('logistic', 'y(x) = L/(1 + exp(a - b*x))', 'Growth that starts exponentially and levels off at L.'),
  trade('weibull', 'F(t) = 1 - exp(-(t/eta)^beta)', 'Fraction failed by time t: lifetimes and strengths.', {
    caution: 'lifetime',
  }),
  trade('hill', 'y(x) = m*x^n/(K^n + x^n)', 'Dose and response with a threshold at K and steepness n.', {
    caution: 'dose',
  }),
  trade(
    'shifted power',
    'Q(h) = c*(h - h0)^b',
    'Rating curve of a gauging station: discharge against stage.',
    {
      caution: 'flood',
    },
  ),
  trade('offset decay', 'y(x) = c + a*exp(-k*x)', 'Decay that ends at a background c.', {
    caution: 'storedEnergy',
  }),
  trade('langmuir', 'q(c) = qm*K*c/(1 + K*c)', 'Adsorption on a surface with one layer of places.', {
    caution: 'drinkingWater',
  }),
  trade('freundlich', 'q(c) = K*c^(1/n)', 'Adsorption on a surface with places of many strengths.', {
    caution: 'drinkingWater',
  }),
  trade('antoine', 'P(T) = 10^(A - B/(T + C))', 'Vapour pressure against temperature.', {
    caution: 'pressure',
  }),
  trade('basquin', 'N(S) = A*S^(-m)', 'Cycles to failure against stress range: fatigue tests.', {
    caution: 'fatigue',
  }),
];

const byName: ReadonlyMap<string, NamedLaw> = new Map(namedLaws.map((one) => [one.name, one]));

/** The law of that name, in any case; undefined when there is none. */
export function namedLaw(name: string): NamedLaw | undefined {
  return byName.get(name.trim().toLowerCase().replace(/\s+/gu, ' '));
}

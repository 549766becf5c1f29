/** A law of some trade with constants and predictors of the size met there. */
export interface TradeLaw {
  readonly trade: string;
  readonly equation: string;
  /** Values of the constants, the known ones first named in `known`. */
  readonly constants: Readonly<Record<string, number>>;
  readonly known?: readonly string[];
  /** Range of the predictor. */
  readonly from: number;
  readonly to: number;
  /** Number of trial constants that the law needs. */
  readonly trials: number;
}

function law(
  trade: string,
  equation: string,
  constants: Readonly<Record<string, number>>,
  range: readonly [number, number],
  trials = 0,
  known: readonly string[] = [],
): TradeLaw {
  return { trade, equation, constants, from: range[0], to: range[1], trials, known };
}

/** Laws from many trades, written in the symbols of the trade (textbook knowledge; constants invented). */
export const tradeLaws: readonly TradeLaw[] = [
  // Kinetics
  law('kinetics', 'c(t) = c0 - k*t', { c0: 2, k: 0.01 }, [1, 150]),
  law('kinetics', 'c(t) = c0*exp(-k*t)', { c0: 1.8, k: 0.03 }, [1, 90]),
  law('kinetics', 'c(t) = c0/(1 + k*c0*t)', { c0: 0.05, k: 1.2 }, [10, 400]),
  law('kinetics', 'c(t) = sqrt(1/(1/c0^2 + 2*k*t))', { c0: 0.4, k: 0.7 }, [1, 60]),
  law('kinetics', 'v(S) = Vmax*S/(Km + S)', { Vmax: 120, Km: 3.4 }, [0.5, 40]),
  law('kinetics', 'v(S) = Vmax*S/(Km*(1 + I/Ki) + S)', { Vmax: 90, Km: 2, I: 1.5, Ki: 0.8 }, [0.5, 30], 0, [
    'I',
    'Ki',
  ]),
  law('kinetics', 'v(S) = Vmax*S/(Km + S + S^2/Ki)', { Vmax: 90, Km: 2, Ki: 25 }, [0.5, 30], 1),
  law('kinetics', 'k(T) = A*exp(-Ea/(R*T))', { A: 4e9, Ea: 62000, R: 8.314462618 }, [290, 350], 0, ['R']),
  law(
    'kinetics',
    'k(T) = kB/h*T*exp(dS/R)*exp(-dH/(R*T))',
    { kB: 1.380649e-23, h: 6.62607015e-34, dS: -20, R: 8.314462618, dH: 70000 },
    [280, 360],
    0,
    ['kB', 'h', 'R'],
  ),
  law('kinetics', 'x(t) = 1 - exp(-K*t^n)', { K: 0.002, n: 2.3 }, [3, 15]),
  law('kinetics', 'x(t) = 1 - (1 - k*t)^3', { k: 0.008 }, [5, 90]),
  // Thermodynamics
  law('thermodynamics', 'P(T): ln(P) = A - B/T', { A: 20, B: 5000 }, [280, 370]),
  law(
    'thermodynamics',
    'P(T) = P0*exp(-L/R*(1/T - 1/T0))',
    { P0: 101325, L: 40700, R: 8.314462618, T0: 373.15 },
    [300, 380],
    0,
    ['R', 'T0'],
  ),
  law('thermodynamics', 'P(T) = 10^(A - B/(C + T))', { A: 8.07, B: 1730, C: 233 }, [5, 95], 1),
  law('thermodynamics', 'p(V) = p0*(V0/V)^g', { p0: 100, V0: 2, g: 1.4 }, [0.6, 3], 0, ['V0']),
  law('thermodynamics', 'T(t) = Ta + (T0 - Ta)*exp(-t/tau)', { Ta: 21, T0: 85, tau: 14 }, [0.5, 40], 1),
  law('thermodynamics', 'T(t) = Ta + (T0 - Ta)*exp(-t/tau)', { Ta: 21, T0: 85, tau: 14 }, [0.5, 40], 0, [
    'Ta',
  ]),
  law('thermodynamics', 'E(T) = sigma*eps*T^4', { sigma: 5.670374419e-8, eps: 0.85 }, [300, 900], 0, [
    'sigma',
  ]),
  law('thermodynamics', 'Cp(T) = a + b*T + c/T^2', { a: 45, b: 0.012, c: -8e5 }, [300, 1200], 1),
  law('thermodynamics', 'eta(T) = A*exp(B/(T - T0))', { A: 0.0003, B: 700, T0: 140 }, [270, 400], 1),
  law(
    'thermodynamics',
    'mu(T) = mu0*(T/T0)^1.5*(T0 + S)/(T + S)',
    { mu0: 1.7e-5, T0: 273, S: 110 },
    [250, 500],
    0,
    ['T0', 'mu0'],
  ),
  // Fluids
  law('fluids', 'Q(h) = C*h^n', { C: 1.8, n: 1.5 }, [0.05, 0.8]),
  law('fluids', 'Q(H) = Cd*(8/15)*sqrt(2*g)*H^2.5', { Cd: 0.58, g: 9.80665 }, [0.05, 0.4], 0, ['g']),
  law('fluids', 'Q(h) = c*(h - h0)^b', { c: 14, h0: 0.3, b: 1.8 }, [0.5, 3], 1),
  law('fluids', 'h(Q) = h0 - k*Q^2', { h0: 42, k: 0.003 }, [5, 90]),
  law('fluids', 'u(z) = us/0.41*ln(z/z0)', { us: 0.3, z0: 0.02 }, [0.5, 30]),
  law('fluids', 'E2(U) = A + B*U^n', { A: 1.3, B: 0.9, n: 0.45 }, [1, 30], 1),
  law('fluids', 'dp(v) = k*rho*v^2/2', { k: 2.3, rho: 998 }, [0.2, 4], 0, ['rho']),
  law('fluids', 'f(Re) = a*Re^(-0.25)', { a: 0.316 }, [4000, 90000]),
  law('fluids', 'h(t) = (sqrt(h0) - k*t)^2', { h0: 1.2, k: 0.01 }, [1, 90]),
  law('fluids', 't(q): t/q = 1/(2*K)*q + 1/C', { K: 3, C: 0.4 }, [0.5, 6]),
  // Soils and water
  law('soils', 'K(psi) = Ks*exp(-alpha*psi)', { Ks: 12, alpha: 0.04 }, [1, 80]),
  law('soils', 'S(psi) = (psib/psi)^lambda', { psib: 25, lambda: 0.7 }, [30, 900]),
  law('soils', 'F(t) = S*sqrt(t)', { S: 0.6 }, [0.5, 80]),
  law('soils', 'i(t) = ic + (i0 - ic)*exp(-k*t)', { ic: 1.2, i0: 9, k: 0.08 }, [1, 60], 1),
  law('soils', 'i(t) = A + S/(2*sqrt(t))', { A: 0.3, S: 4 }, [0.5, 60]),
  law('soils', 'e(s) = e0 - Cc*log10(s/s0)', { e0: 0.9, Cc: 0.3, s0: 100 }, [110, 1600], 0, ['s0']),
  law('soils', 'tau(s) = c + s*tan(phi)', { c: 12, phi: 0.5 }, [20, 400]),
  law('soils', 's(t) = t/(a + b*t)', { a: 3, b: 0.08 }, [1, 200]),
  law('soils', 'I(T) = A/(T + B)', { A: 900, B: 12 }, [5, 180]),
  law(
    'soils',
    's(t) = Q/(4*pi*Tr)*ln(2.25*Tr*t/(r^2*S))',
    { Q: 800, Tr: 300, r: 30, S: 0.0002 },
    [0.02, 2],
    0,
    ['Q', 'r'],
  ),
  // Electronics and sensors
  law('sensors', 'R(T) = R25*exp(B*(1/T - 1/298.15))', { R25: 10000, B: 3950 }, [270, 380]),
  law('sensors', 'T(R): 1/T = A + B*ln(R)', { A: 0.0011, B: 0.00024 }, [500, 30000]),
  law('sensors', 'R(T) = R0*(1 + alpha*T)', { R0: 100, alpha: 0.00385 }, [1, 200]),
  law('sensors', 'I(V) = Is*(exp(V/(n*0.02585)) - 1)', { Is: 1e-9, n: 1.7 }, [0.2, 0.7], 1),
  law('sensors', 'I(V) = Is*exp(V/(n*VT))', { Is: 1e-12, n: 1.2, VT: 0.02585 }, [0.4, 0.7], 0, ['VT']),
  law('sensors', 'f(C) = 1/(2*pi*sqrt(L*C))', { L: 0.001 }, [1e-9, 1e-7]),
  law('sensors', 'A(c) = eps*c*l', { eps: 6200, l: 1 }, [1e-5, 2e-4], 0, ['l']),
  law('sensors', 'E(a) = E0 + S*log10(a)', { E0: 200, S: 58 }, [1e-5, 0.1]),
  law('sensors', 'R(c) = K*c^(-m)', { K: 30, m: 0.6 }, [10, 5000]),
  law('sensors', 'F0(Q) = F*(1 + Ksv*Q)', { F: 1, Ksv: 3 }, [0.1, 2]),
  law('sensors', 'V(t) = V0*(1 - exp(-t/tau))', { V0: 5, tau: 2.2 }, [0.2, 9], 1),
  // Reliability
  law('reliability', 'F(t) = 1 - exp(-(t/eta)^beta)', { eta: 1200, beta: 1.8 }, [100, 2500]),
  law('reliability', 'R(t) = exp(-lambda*t)', { lambda: 0.0004 }, [100, 4000]),
  law('reliability', 'N(S) = A*S^(-m)', { A: 2e12, m: 3 }, [60, 400]),
  law('reliability', 'L(V) = A*V^(-n)', { A: 1e9, n: 4 }, [10, 60]),
  law('reliability', 'M(T) = K*T^alpha', { K: 0.02, alpha: 0.6 }, [50, 5000]),
  law('reliability', 'F(x) = exp(-exp(-(x - mu)/beta))', { mu: 40, beta: 7 }, [28, 70]),
  law('reliability', 't(T) = A*exp(Ea/(8.617333262e-5*T))', { A: 1e-6, Ea: 0.7 }, [330, 420]),
  law('reliability', 'eps(N) = sf/E*(2*N)^b', { sf: 900, E: 210000, b: -0.09 }, [100, 1e6], 0, ['E']),
  // Biology
  law('biology', 'N(t) = N0*2^(t/td)', { N0: 1000, td: 0.5 }, [0.2, 5]),
  law('biology', 'N(t) = K/(1 + A*exp(-r*t))', { K: 500, A: 30, r: 0.4 }, [0.5, 15], 1),
  law('biology', 'W(L) = a*L^b', { a: 0.01, b: 3.1 }, [5, 60]),
  law('biology', 'L(t) = Linf*(1 - exp(-K*(t - t0)))', { Linf: 60, K: 0.3, t0: -0.4 }, [0.5, 12], 1),
  law('biology', 'y(t) = A*exp(-b*exp(-k*t))', { A: 10, b: 4, k: 0.5 }, [0.5, 10], 1),
  law('biology', 'B(L) = Bmax*L/(Kd + L) + NS*L', { Bmax: 80, Kd: 4, NS: 0.5 }, [0.3, 60], 1),
  law('biology', 'S(A) = c*A^z', { c: 20, z: 0.25 }, [1, 3000]),
  law('biology', 'R(S) = a*S*exp(-b*S)', { a: 4, b: 0.01 }, [5, 250]),
  law('biology', 'E(D) = Emax*D^n/(ED50^n + D^n)', { Emax: 100, ED50: 3, n: 1.4 }, [0.3, 40], 1),
  law('biology', 'P(I) = Pm*tanh(a*I/Pm)', { Pm: 12, a: 0.1 }, [10, 300], 1),
  // Materials
  law('materials', 'sigma(e) = K*e^n', { K: 500, n: 0.2 }, [0.01, 0.3]),
  law('materials', 'sy(d) = s0 + k/sqrt(d)', { s0: 70, k: 0.7 }, [1e-6, 1e-4]),
  law('materials', 'rate(s) = A*sinh(alpha*s)', { A: 0.002, alpha: 0.05 }, [10, 90], 1),
  law('materials', 'x2(t): x2^2 = k*t', { k: 3 }, [0.5, 40]),
  law('materials', 'h(t) = a*ln(1 + t/tau)', { a: 4, tau: 3 }, [0.5, 60], 1),
  law('materials', 'rho(T) = rho0 + A*T^2', { rho0: 1.2, A: 0.003 }, [2, 30]),
  law('materials', 's(p) = exp(-b*p)*s0', { b: 5, s0: 300 }, [0.02, 0.5]),
  law('materials', 'D(T) = D0*exp(-Q/(k*T))', { D0: 2e-5, Q: 1.2, k: 8.617333262e-5 }, [700, 1400], 0, ['k']),
  law('materials', 'q(c) = qm*(K*c)^n/(1 + (K*c)^n)', { qm: 5, K: 0.3, n: 0.8 }, [0.2, 40], 1),
  law('materials', 'T(L) = 2π√(L/g)', { g: 9.81 }, [0.2, 2]),
];

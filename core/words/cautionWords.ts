/** What a user of a law is told before relying on its constants; each ends with whom to ask. */
export const cautionWords = {
  fatigue: (): string =>
    'Fatigue: the fitted line is the typical life of these specimens, half of which fail earlier, and says nothing beyond the tested stresses; allowable stresses come from the design code that applies and from a licensed engineer.',
  drinkingWater: (): string =>
    'If this is drinking water: constants hold for this water and temperature only; doses and contact times follow local regulations and a licensed operator or engineer.',
  dose: (): string =>
    'Dose: a fitted response does not make a dose safe, least of all beyond the readings; doses are set under the rules that apply and by licensed practitioners.',
  pressure: (): string =>
    'Pressure: a fitted vapour pressure is no basis for relief devices or design pressures, which follow the pressure equipment code that applies and a licensed engineer.',
  storedEnergy: (): string =>
    'If energy is stored: what should have decayed may still hold charge, heat or pressure; verify by measurement, and follow the local lock-out rules and a qualified person.',
  heat: (): string =>
    'Temperature: rates carried to temperatures outside the readings can be wrong by orders of magnitude; shelf life, ageing and runaway limits follow the standard that applies and a qualified engineer.',
  lifetime: (): string =>
    'Lifetime: few failures settle the tails poorly; safety and warranty limits follow the standard that applies and a qualified engineer.',
  flood: (): string =>
    'Rating: discharge above the highest gauged stage is extrapolated; flood levels and structures follow the rules of the authority that applies and a licensed engineer.',
};

export type CautionWord = keyof typeof cautionWords;

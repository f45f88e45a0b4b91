/** The lines d, F and C. */
export const LINES = { mainNm: 587.5618, shortNm: 486.1327, longNm: 656.2725 };

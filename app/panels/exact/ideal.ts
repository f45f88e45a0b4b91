/** What is said where exact rays cannot differ from paraxial ones. */
export const IDEAL =
  'All parts are ideal: exact rays run where the paraxial ones do. Thicken a part, or place glass, to see them go apart.';

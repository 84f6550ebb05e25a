/** Title and sentence for whatever a query or mutation threw; screens take it from here and never speak to the client. */
export { errorInWords, isPassing, problemInWords } from '../api/problem';
export type { ApiError, ApiProblem } from '../api/problem';

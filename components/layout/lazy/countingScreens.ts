/**
 * The screens that need the arithmetic of samples and lines, as one part of the client that is loaded when one
 * of them is opened. What two parts share would be loaded with the first view, so they are one part.
 */
export { BenchScreen } from '../../bench/BenchScreen';
export { ReviewScreen } from '../../review/ReviewScreen';
export { SubmissionScreen } from '../../submissions/SubmissionScreen';

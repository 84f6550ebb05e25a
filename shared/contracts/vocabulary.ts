import { z } from 'zod';

/**
 * The closed vocabularies of the register. The database repeats them as checks, forms list them,
 * contracts validate with them; a word is added here and nowhere else.
 */
export const roles = ['contributor', 'reviewer', 'curator', 'administrator'] as const;

/** Life of one revision of a submission. */
export const revisionStatuses = ['draft', 'submitted', 'changes-requested', 'approved', 'declined', 'withdrawn'] as const;
/** What may be decided on a submitted revision. */
export const decisionKinds = ['approve', 'request-changes', 'decline'] as const;
/** Life of a re-check. */
export const recheckStatuses = ['open', 'answered', 'closed'] as const;
export const recheckAnswerKinds = ['confirmed', 'corrected', 'withdrawn'] as const;

export const submissionKinds = ['specimen', 'literature'] as const;
export const nameQualifiers = ['none', 'sp.', 'cf.', 'hybrid', 'subspecies'] as const;
export const origins = ['wild', 'captive', 'domestic', 'strain', 'unknown'] as const;
export const sexes = ['female', 'male', 'unknown'] as const;
export const ageClasses = ['foetal', 'infant', 'juvenile', 'subadult', 'adult', 'aged', 'unknown'] as const;
export const bodyMassKinds = ['measured', 'estimated', 'literature', 'unknown'] as const;
export const massStates = ['fresh', 'fixed', 'cryoprotected', 'unknown'] as const;
export const fixations = ['perfused', 'immersed', 'none', 'unknown'] as const;
/** Method of counting. */
export const countingMethods = [
  'isotropic fractionation, by eye',
  'isotropic fractionation, flow cytometry',
  'isotropic fractionation, automated imaging',
  'stereology',
  'no count',
  'other',
] as const;
export const sides = ['left', 'right', 'both', 'midline', 'not-stated'] as const;
export const scaleUpKinds = ['none', 'other-side', 'mass-fraction', 'slab-series'] as const;
export const exclusionReasons = ['bubble', 'clump', 'overfilled', 'spill', 'other'] as const;
export const delineationCriteria = [
  'cytoarchitecture',
  'topographic-map',
  'anatomical-connectivity',
  'cellular-response-properties',
  'regional-response',
  'gross-landmarks',
] as const;
export const centreKinds = ['arithmetic', 'geometric', 'median', 'single', 'not-stated'] as const;
export const spreadKinds = ['SD', 'SE', 'CI95', 'range', 'none', 'not-stated'] as const;
export const overlapKinds = ['none', 'same', 'partly', 'unknown'] as const;
export const approvalKinds = ['number', 'permit', 'exempt', 'see-source'] as const;
export const massUnits = ['g', 'mg', 'kg'] as const;
export const volumeUnits = ['mL', 'µL', 'L'] as const;
export const attachmentTypes = ['application/pdf', 'image/png', 'image/jpeg', 'image/tiff', 'text/csv'] as const;

/** Variables a fit can put on an axis. Body mass belongs to no structure; every other one does. */
export const variables = [
  'bodyMassG',
  'structureMassG',
  'cells',
  'neurons',
  'otherCells',
  'neuronsPerMg',
  'cellsPerMg',
  'otherToNeuronRatio',
] as const;
export const fitMethods = ['ols', 'sma', 'ma', 'pgls-brownian', 'pgls-lambda'] as const;
export const flagKinds = ['none', 'watch', 'outlier', 'influential'] as const;
export const checkLevels = ['blocks', 'warns', 'passes'] as const;

export const roleSchema = z.enum(roles);
export const revisionStatusSchema = z.enum(revisionStatuses);
export const decisionKindSchema = z.enum(decisionKinds);
export const recheckStatusSchema = z.enum(recheckStatuses);
export const recheckAnswerKindSchema = z.enum(recheckAnswerKinds);
export const variableSchema = z.enum(variables);
export const fitMethodSchema = z.enum(fitMethods);
export const flagKindSchema = z.enum(flagKinds);
export const checkLevelSchema = z.enum(checkLevels);

export type Role = (typeof roles)[number];
export type RevisionStatus = (typeof revisionStatuses)[number];
export type DecisionKind = (typeof decisionKinds)[number];
export type RecheckStatus = (typeof recheckStatuses)[number];
export type RecheckAnswerKind = (typeof recheckAnswerKinds)[number];
export type Variable = (typeof variables)[number];
export type FitMethod = (typeof fitMethods)[number];
export type FlagKind = (typeof flagKinds)[number];
export type CheckLevel = (typeof checkLevels)[number];

import { fitsAnswerSchema, fitsRequestSchema } from '../../shared/contracts/fits';
import { estimateAnswerSchema, estimateRequestSchema } from '../../shared/contracts/samples';
import { calculatorLimit } from '../calculatorLimit';
import { defineRoute } from '../routing';
import { fitPoints } from '../services/dataset/fitAnswer';
import { estimateOne } from '../services/dataset/sampleAnswer';

export const calculatorRoutes = [
  defineRoute({
    method: 'post',
    path: '/samples/estimate',
    action: 'read-published',
    summary: 'Cells, neurons and other cells of one sample from its counts; nothing is stored',
    body: estimateRequestSchema,
    answer: estimateAnswerSchema,
    limit: calculatorLimit,
    handle: async ({ body }) => estimateOne(body),
  }),
  defineRoute({
    method: 'post',
    path: '/fits',
    action: 'read-published',
    summary: 'Fits y = a·x^b to the points given, one line a group; nothing is stored',
    body: fitsRequestSchema,
    answer: fitsAnswerSchema,
    limit: calculatorLimit,
    handle: async ({ body }) => fitPoints(body),
  }),
];

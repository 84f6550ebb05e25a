import { registerSchema } from '../../shared/contracts/register';
import { defineRoute } from '../routing';
import { describeRegister } from '../services/dataset/register';

export const registerRoutes = [
  defineRoute({
    method: 'get',
    path: '/register',
    action: 'read-published',
    summary: 'What the first screen shows: current version, exponents, newest records, and what waits for the person',
    answer: registerSchema,
    handle: ({ context, visitor }) => describeRegister(context, visitor),
  }),
];

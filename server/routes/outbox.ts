import { z } from 'zod';
import { outboxMailSchema } from '../../shared/contracts/people';
import { notFound } from '../errors';
import { defineRoute } from '../routing';

export const outboxRoutes = [
  defineRoute({
    method: 'get',
    path: '/outbox',
    action: 'administer',
    summary: 'Mails as sent, newest first; only in a demonstration register, where nobody else receives them',
    answer: z.object({ items: z.array(outboxMailSchema) }),
    handle: async ({ context }) => {
      if (!context.demo) throw notFound('The outbox');
      const sent = await context.mailer.listSent(100);
      return { items: sent.map(({ id, to, subject, text, sentAt }) => ({ id, to: to.join(', '), subject, text, sentAt: new Date(sentAt).toISOString() })) };
    },
  }),
];

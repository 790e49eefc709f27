import { caughtMailListSchema } from '../../../shared/account.ts';
import { notFound } from '../../errors.ts';
import { anyone } from '../../policies/policy.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';

const listMails = route({
  method: 'get',
  path: '/development/mails',
  summary: 'Mail that the local mail server of development caught, newest first; not there in production.',
  policy: anyone,
  answer: { status: 200, schema: caughtMailListSchema },
  handler({ dependencies: { config, mailCatcher } }) {
    // Checked twice over: these mails open accounts.
    if (config.production || !mailCatcher) throw notFound('address');
    const mails = mailCatcher.mails();
    return { mails: mails.map((mail) => ({ ...mail, receivedAt: mail.receivedAt.toISOString() })) };
  },
});

export const developmentRoutes: Route[] = [listMails];

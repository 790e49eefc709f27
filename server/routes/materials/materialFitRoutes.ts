import { fitMaterialSchema, fitResultSchema } from '../../../shared/materialFit.ts';
import { ComputeError } from '../../../worker/sweep/computeError.ts';
import { gone } from '../../errors.ts';
import { readGroup } from '../../policies/group.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';
import { fitMaterialOf } from '../../services/fits.ts';

const fitMaterial = route({
  method: 'post',
  path: '/groups/:groupId/fits',
  summary: 'Fit a model to the tabulated points of a material; it ends when the asker hangs up.',
  noun: 'group',
  policy: readGroup,
  body: fitMaterialSchema,
  load: ({ dependencies, params }) => dependencies.models.Group.findByPk(params.groupId),
  answer: { status: 200, schema: fitResultSchema },
  async handler({ dependencies, actor, subject, body, response }) {
    const hungUp = new AbortController();
    response.once('close', () => hungUp.abort());
    try {
      return await fitMaterialOf(dependencies, actor, subject.id, body, hungUp.signal);
    } catch (error) {
      // Nobody reads this any more; it keeps the end of a fit out of the log of failures.
      if (error instanceof ComputeError && error.failure === 'cancelled' && hungUp.signal.aborted) {
        throw gone('The fit ended because nobody waited for it.');
      }
      throw error;
    }
  },
});

export const materialFitRoutes: Route[] = [fitMaterial];

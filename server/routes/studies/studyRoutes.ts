import {
  createStudySchema,
  studyListSchema,
  studySchema,
  studyVersionListSchema,
  updateStudySchema,
} from '../../../shared/study.ts';
import type { AppDependencies } from '../../dependencies.ts';
import { addToGroup, readGroup } from '../../policies/group.ts';
import { changeStudy, readStudy as mayRead } from '../../policies/study.ts';
import { presentStudy, presentStudySummary, presentStudyVersions } from '../../presenters/presentStudy.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';
import {
  createStudy,
  deleteStudy,
  listStudies,
  listStudyVersions,
  loadStudy,
  updateStudy,
} from '../../services/studies.ts';

const listStudiesOfGroup = route({
  method: 'get',
  path: '/groups/:groupId/studies',
  summary: 'The studies of a group, the one saved last first.',
  noun: 'group',
  policy: readGroup,
  load: ({ dependencies, params }) => dependencies.models.Group.findByPk(params.groupId),
  answer: { status: 200, schema: studyListSchema },
  async handler({ dependencies, subject }) {
    const studies = await listStudies(dependencies.models, subject.id);
    return { studies: studies.map(({ study, newest }) => presentStudySummary(study, newest)) };
  },
});

const createStudyInGroup = route({
  method: 'post',
  path: '/groups/:groupId/studies',
  summary: "Put a new study into a group; its runs and designs must be the group's.",
  noun: 'group',
  policy: addToGroup,
  body: createStudySchema,
  load: ({ dependencies, params }) => dependencies.models.Group.findByPk(params.groupId),
  answer: { status: 201, schema: studySchema },
  async handler({ dependencies, actor, subject, body }) {
    const { study, newest } = await createStudy(dependencies.models, actor, subject.id, body);
    return presentStudy(study, newest);
  },
});

const loadRow = ({ dependencies, params }: { dependencies: AppDependencies; params: { studyId: string } }) =>
  dependencies.models.Study.findByPk(params.studyId);

const readStudy = route({
  method: 'get',
  path: '/studies/:studyId',
  summary: 'A study in its newest version.',
  noun: 'study',
  policy: mayRead,
  async load({ dependencies, params }) {
    const found = await loadStudy(dependencies.models, params.studyId);
    return found && { ...found, groupId: found.study.groupId };
  },
  answer: { status: 200, schema: studySchema },
  handler: ({ subject }) => presentStudy(subject.study, subject.newest),
});

const listVersions = route({
  method: 'get',
  path: '/studies/:studyId/versions',
  summary: 'Who saved which version of a study when, and what it changed, newest first.',
  noun: 'study',
  policy: mayRead,
  load: loadRow,
  answer: { status: 200, schema: studyVersionListSchema },
  async handler({ dependencies, subject }) {
    return presentStudyVersions(await listStudyVersions(dependencies.models, subject.id));
  },
});

const saveStudy = route({
  method: 'patch',
  path: '/studies/:studyId',
  summary: 'Save a new version; refused when somebody saved since the version that the edit started from.',
  noun: 'study',
  policy: changeStudy,
  body: updateStudySchema,
  load: loadRow,
  answer: { status: 200, schema: studySchema },
  async handler({ dependencies, actor, subject, body }) {
    const { study, newest } = await updateStudy(dependencies.models, actor, subject.id, body);
    return presentStudy(study, newest);
  },
});

const removeStudy = route({
  method: 'delete',
  path: '/studies/:studyId',
  summary: 'Delete a study with its history; the runs and designs it shows stay, its links end.',
  noun: 'study',
  policy: changeStudy,
  load: loadRow,
  answer: { status: 204, schema: null },
  handler: ({ dependencies, actor, subject }) => deleteStudy(dependencies.models, actor, subject),
});

export const studyRoutes: Route[] = [
  listStudiesOfGroup,
  createStudyInGroup,
  readStudy,
  listVersions,
  saveStudy,
  removeStudy,
];

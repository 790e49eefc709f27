import type { z } from 'zod';
import type { Study as PresentedStudy, StudySummary, studyVersionListSchema } from '../../shared/study.ts';
import type { Study } from '../models/study.ts';
import type { StudyVersion } from '../models/studyVersion.ts';

/** @param newest the study's newest version, with its author */
export function presentStudySummary(study: Study, newest: StudyVersion): StudySummary {
  return {
    id: study.id,
    groupId: study.groupId,
    title: study.title,
    question: study.question,
    version: newest.version,
    itemCount: study.itemCount,
    decided: presentDecided(study),
    isDemo: study.isDemo,
    updatedAt: newest.createdAt.toISOString(),
    updatedBy: newest.author?.name ?? null,
  };
}

/** @param newest the study's newest version, with its author */
export function presentStudy(study: Study, newest: StudyVersion): PresentedStudy {
  return { ...presentStudySummary(study, newest), document: newest.document };
}

/** @param versions newest first, with their authors */
export function presentStudyVersions(versions: StudyVersion[]): z.input<typeof studyVersionListSchema> {
  return {
    versions: versions.map(({ version, createdAt, author, changes }) => ({
      version,
      savedAt: createdAt.toISOString(),
      savedBy: author?.name ?? null,
      changes,
    })),
  };
}

export function presentDecided({ decidedBy, decidedAt }: Study): PresentedStudy['decided'] {
  return decidedBy !== null && decidedAt !== null ? { by: decidedBy, at: decidedAt.toISOString() } : null;
}

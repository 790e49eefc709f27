import type { CreatedLink, Link, createLinkSchema } from '../../../shared/link.ts';
import type { z } from 'zod';
import type { AppDependencies } from '../../dependencies.ts';
import { presentCreatedLink, presentLink } from '../../presenters/presentLink.ts';
import { createLink, listLinks } from '../../services/links.ts';

/** The links of one run, design, study or group, newest first. */
export async function answerLinks(
  { models }: AppDependencies,
  where: Parameters<typeof listLinks>[1],
): Promise<{ links: Link[] }> {
  return { links: (await listLinks(models, where)).map(presentLink) };
}

/** A new link, with the address that only this answer carries. */
export async function answerNewLink(
  { models, publicUrl }: AppDependencies,
  actor: Parameters<typeof createLink>[1],
  shareable: Parameters<typeof createLink>[2],
  { label, expiresAt }: z.output<typeof createLinkSchema>,
): Promise<CreatedLink> {
  const wanted = { label, expiresAt: expiresAt ? new Date(expiresAt) : null };
  const { link, token } = await createLink(models, actor, shareable, wanted);
  return presentCreatedLink(link, token, publicUrl());
}

import type { Request } from 'express';
import { Strategy } from 'passport';
import { Op } from 'sequelize';
import type { Config } from '../config.ts';
import type { Models } from '../models/models.ts';
import { hashSecret } from '../services/secrets.ts';
import { loadActor } from './loadActor.ts';

/** "Last used" is for people: once a minute is exact enough and spares a write per request. */
const NOTE_USE_EVERY_MS = 60_000;

/** `Authorization: Bearer <API token>`. */
export class TokenStrategy extends Strategy {
  override name = 'token';

  constructor(private readonly dependencies: { models: Models; config: Pick<Config, 'production'> }) {
    super();
  }

  override authenticate(request: Request): void {
    const secret = /^Bearer ([\w-]{1,200})$/.exec(request.get('authorization') ?? '')?.[1];
    if (secret === undefined) {
      this.fail('malformed');
      return;
    }
    this.findActor(secret).then(
      (actor) => (actor ? this.success(actor) : this.fail('unknown')),
      (error: unknown) => this.error(error),
    );
  }

  private async findActor(secret: string) {
    const { ApiToken } = this.dependencies.models;
    const token = await ApiToken.findOne({ where: { tokenHash: hashSecret(secret) } });
    if (!token) return null;
    const actor = await loadActor(this.dependencies, token.userId, 'token', null);
    const now = Date.now();
    const stale = new Date(now - NOTE_USE_EVERY_MS);
    if (actor && (token.lastUsedAt === null || token.lastUsedAt < stale)) {
      await ApiToken.update(
        { lastUsedAt: new Date(now) },
        { where: { id: token.id, lastUsedAt: { [Op.or]: [{ [Op.is]: null }, { [Op.lt]: stale }] } } },
      );
    }
    return actor;
  }
}

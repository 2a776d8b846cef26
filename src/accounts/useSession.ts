import { useQuery } from '@tanstack/react-query';
import type { Me, SessionAnswer, SiteAbilities } from '#shared/api/accounts.ts';
import { defaultSettings, type MemberSettings } from '#shared/api/settings.ts';
import type { Units } from '#shared/units/units.ts';
import { sessionQueries } from './session-queries.ts';

const NOTHING: SiteAbilities = { write: false, handIn: false, moderate: false, administer: false };
const VISITOR: SessionAnswer = { me: null, abilities: NOTHING, token: null };

export interface Session {
  readonly me: Me | null;
  readonly abilities: SiteAbilities;
  readonly settings: MemberSettings;
  /** How numbers are shown. */
  readonly units: Units;
  /** False until the server has said who reads. */
  readonly known: boolean;
}

const visitorSettings = defaultSettings();

/** Who reads, what they may do, and how they like numbers; a visitor until the server has said. */
export function useSession(): Session {
  const query = useQuery(sessionQueries.current());
  const { me, abilities } = query.data ?? VISITOR;
  const settings = me?.settings ?? visitorSettings;
  return {
    me,
    abilities,
    settings,
    units: { temperature: settings.temperature, system: settings.system },
    known: query.data !== undefined || query.isError,
  };
}

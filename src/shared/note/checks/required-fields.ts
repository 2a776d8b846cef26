import type { Piece, Recipe } from '../pieces.ts';
import { ROUTES } from '../../vocabulary/ware.ts';
import type { Route } from '../../vocabulary/ware.ts';
import { mustMend } from './check.ts';
import type { Check, CheckContext } from './check.ts';

/** Routes in which the ware goes into a container with something to burn. */
const COVERING_ROUTES: readonly Route[] = ['covered', 'crackle-then-smoked', 'slip-resist'];

function whenChecks({ fields, earlier, today }: CheckContext): Check[] {
  const { when } = fields;
  const checks: Check[] = [];
  if (when.date === null) {
    checks.push(mustMend('date-missing', '/when/date', 'Say which day you fired.'));
  } else if (when.date > today) {
    checks.push(
      mustMend(
        'date-in-future',
        '/when/date',
        'This day is still to come. Put in the day you fired.',
      ),
    );
  }
  if (when.startTime === null) {
    checks.push(
      mustMend(
        'start-time-missing',
        '/when/startTime',
        'Say when you lit it, roughly if need be: it puts the firings of one day in order.',
      ),
    );
  }
  if (when.startClass === null) {
    checks.push(
      mustMend(
        'start-class-missing',
        '/when/startClass',
        'Say whether the kiln was cold (below 100 °C) or hot when you lit it. The two are never compared.',
      ),
    );
  }
  if (earlier && when.unreportedFirings === null) {
    checks.push(
      mustMend(
        'unreported-firings-missing',
        '/when/unreportedFirings',
        'Say how many firings of this kiln since the last one written up have no note. None is 0.',
      ),
    );
  }
  return checks;
}

/** Whether the firing came to its aim, as far as can be told: null when it cannot. */
function cameToAim({ fields: { plan }, reading }: CheckContext): boolean | null {
  if (plan.drawnBecause === 'gave-up') return false;
  if (plan.drawnBecause === 'melt' || plan.drawnBecause === 'cone') return true;
  if (reading) return reading.reachedMinute !== null || reading.aimCelsius === null;
  if (plan.targetCelsius === null || plan.peakCelsius === null) return null;
  return plan.peakCelsius >= plan.targetCelsius - 5;
}

function knownByChecks(
  what: 'target' | 'peak',
  by: 'temperature' | 'cone' | 'eye' | null,
  celsius: number | null,
  cone: string,
): Check[] {
  const words = what === 'target' ? 'you aimed for' : 'it got to';
  if (by === null) {
    return [
      mustMend(
        `${what}-missing`,
        `/plan/${what}By`,
        `Say how hot ${words}: a temperature, a cone, or by eye.`,
      ),
    ];
  }
  if (by === 'temperature' && celsius === null) {
    return [
      mustMend(
        `${what}-missing`,
        `/plan/${what}Celsius`,
        `Put in the temperature ${words}, or choose a cone or “by eye”.`,
      ),
    ];
  }
  if (by === 'cone' && cone.trim() === '') {
    return [
      mustMend(`${what}-missing`, `/plan/${what}Cone`, `Put in the number of the cone ${words}.`),
    ];
  }
  return [];
}

/** What the record tells need not be typed: peak, time and hold are asked for only without it. */
function planChecks(context: CheckContext): Check[] {
  const { plan } = context.fields;
  const { reading } = context;
  const checks: Check[] = [];
  if (plan.drawnBecause === null) {
    checks.push(
      mustMend(
        'drawn-because-missing',
        '/plan/drawnBecause',
        'Say what told you to draw: the melt, a cone, the temperature, the time, or that you gave up.',
      ),
    );
  }
  checks.push(...knownByChecks('target', plan.targetBy, plan.targetCelsius, plan.targetCone));
  if (!(reading && plan.peakBy === null)) {
    checks.push(...knownByChecks('peak', plan.peakBy, plan.peakCelsius, plan.peakCone));
  }
  if (
    plan.timeToTemperatureMinutes === null &&
    reading?.timeToTemperatureMinutes == null &&
    cameToAim(context) !== false
  ) {
    checks.push(
      mustMend(
        'time-to-temperature-missing',
        '/plan/timeToTemperatureMinutes',
        'Say how many minutes it took to get there. If it never did, choose “gave up” as the reason for drawing.',
      ),
    );
  }
  if (!plan.noHold && plan.holdKeptMinutes === null && reading?.hold == null) {
    checks.push(
      mustMend(
        'hold-missing',
        '/plan/holdKeptMinutes',
        'Say how many minutes you held it, or that there was no hold.',
        { pointer: '/plan/noHold', value: true, label: 'No hold' },
      ),
    );
  }
  return checks;
}

function recipeChecks(pointer: string, where: string, route: Route, recipe: Recipe): Check[] {
  const checks: Check[] = [];
  const name = ROUTES[route].toLowerCase();
  if (recipe.container === null) {
    checks.push(
      mustMend(
        'container-missing',
        `${pointer}/container`,
        `${where}: say what the ware went into after the draw (“${name}”).`,
      ),
    );
  }
  if (recipe.combustibles.length === 0) {
    checks.push(
      mustMend(
        'combustible-missing',
        `${pointer}/combustibles`,
        `${where}: say what it was smoked with (“${name}”).`,
      ),
    );
  }
  return checks;
}

function pieceChecks(piece: Piece, row: number): Check[] {
  const at = `/pieces/${String(row)}`;
  const where = `Piece row ${String(row + 1)}`;
  const checks: Check[] = [];
  const missing = (code: string, field: keyof Piece, text: string): void => {
    checks.push(mustMend(code, `${at}/${field}`, `${where}: ${text}`));
  };
  if (piece.form === null) missing('form-missing', 'form', 'say what it is.');
  if (piece.count === null) missing('count-missing', 'count', 'say how many are alike.');
  if (piece.route === null) missing('route-missing', 'route', 'say what happened after the draw.');
  // Bare ware has no glaze to melt.
  if (piece.melt === null && piece.glazeFamily !== 'none') {
    missing(
      'melt-missing',
      'melt',
      'say whether the glaze was under-fired, matured or over-fired.',
    );
  }
  if (piece.cracked === null) missing('cracks-missing', 'cracked', 'say whether it cracked.');
  if (piece.cracked === true && piece.cracks.length === 0) {
    missing('crack-without-place', 'cracks', 'it cracked; say where, and when you noticed.');
  }
  if (piece.whole === null) missing('whole-missing', 'whole', 'say whether it came out whole.');
  return checks;
}

function piecesChecks({ fields: { pieces, reduction } }: CheckContext): Check[] {
  if (pieces.length === 0) {
    return [mustMend('pieces-missing', '/pieces', 'Put in at least one piece.')];
  }
  const checks = pieces.flatMap(pieceChecks);
  const shared = pieces.find(
    ({ route, recipe }) => route !== null && recipe === null && COVERING_ROUTES.includes(route),
  );
  if (shared?.route) {
    checks.push(...recipeChecks('/reduction', 'After the draw', shared.route, reduction));
  }
  pieces.forEach(({ route, recipe }, row) => {
    if (route === null || recipe === null || !COVERING_ROUTES.includes(route)) return;
    const where = `Piece row ${String(row + 1)}`;
    checks.push(...recipeChecks(`/pieces/${String(row)}/recipe`, where, route, recipe));
  });
  return checks;
}

/** Everything handing in requires of the structured fields. */
export function requiredFieldChecks(context: CheckContext): Check[] {
  const { fields, kiln } = context;
  const checks = whenChecks(context);
  if (fields.kilnId === null || kiln === null) {
    checks.push(
      mustMend('kiln-missing', '/kilnId', 'Choose the kiln you fired, or describe it once.'),
    );
  }
  checks.push(...planChecks(context), ...piecesChecks(context));
  return checks;
}

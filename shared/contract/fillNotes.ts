import type { FillOutcome, FillSetup, FillWish, SyncKind, UsedFlash } from '../math/fill/fillTypes';
import type { LimitInTheWay } from '../math/fill/limitInTheWay';
import { cameraGrid } from '../math/fill/cameraGrid';
import { UNMEASURED_EXTRA_STOPS } from '../math/flashDemand';
import { flashRemedies } from '../math/flashExposure';
import type { CautionCode } from '../text';
import { note, type Remark } from './answer';
import type { FillCheckIn, FillRecipesIn } from './fillIn';

/** Scenes as bright as this are lit by the sun; common practice: sunny weather is EV 15. */
const SUNLIT_EV100 = 14;
/** Scenes as dark as this are night, or soon will be; common practice, no source. */
const NIGHT_EV100 = 5;

/** What of an answer the notes are about. */
interface Shown {
  readonly sync: SyncKind;
  readonly flashes: readonly UsedFlash[];
  readonly outcome: FillOutcome;
}

/** What was assumed about movement, sync and pulses in what is shown. */
export function motionNotes(
  given: FillRecipesIn | FillCheckIn,
  setup: FillSetup,
  shown: readonly Shown[],
): Remark[] {
  const notes: Remark[] = [];
  const { view, subject, support } = given;
  if ((subject || support?.kind === 'handheld') && !view) notes.push(note('view_needed'));
  if (subject && view && view.pixelPitchUm === undefined)
    notes.push(note('pixel_pitch_assumed', { pitchUm: setup.motion.view?.pitchUm ?? 0 }));
  if (shown.some(({ outcome }) => outcome.ghost !== null)) notes.push(note('visibility_by_practice'));
  if (subject && view && shown.some(({ sync, outcome }) => sync === 'normal' && outcome.blur === null))
    notes.push(note('duration_needed'));
  if (shown.some(({ sync }) => sync === 'highSpeed')) notes.push(note('hss_as_continuous'));
  if (
    shown.some(({ sync }) => sync === 'highSpeed') &&
    given.camera.highSpeedSync?.extraLossStops === undefined
  )
    notes.push(note('hss_loss_unmeasured', { extraStops: UNMEASURED_EXTRA_STOPS }));
  const isSlower = ({ flash, power }: UsedFlash) =>
    flash.t05S !== null && flash.control === 'voltage' && power < 1;
  if (shown.some(({ flashes }) => flashes.some(isSlower))) notes.push(note('duration_only_measurable'));
  return notes;
}

function outshoneNote(wish: FillWish, whyNot: readonly LimitInTheWay[]): Remark[] {
  const short = whyNot.find(({ limit }) => limit === 'key_power' || limit === 'fill_power');
  const role = short?.limit === 'fill_power' ? 'fill' : 'key';
  const [flash, ...more] = wish.flashes.filter((one) => one.role === role);
  const isOfCamera = ({ limit }: LimitInTheWay) => /^(aperture|iso|nd|shutter)_/.test(limit);
  if (!short || !flash || more.length > 0 || whyNot.some(isOfCamera)) return [];
  const stops = short.shortByStops ?? 0;
  const by = flashRemedies(stops);
  return [
    note('flash_outshone', {
      stops,
      roomStops: 0,
      distanceM: flash.nearM * by.distanceFactor,
      heads: by.headsFactor,
      lessLossStops: stops <= flash.lossStops ? stops : null,
    }),
  ];
}

/** Which of the camera's settings have no mark within their limits. */
function withoutMarks(wish: FillWish): string[] {
  const { aperture, iso, shutters } = cameraGrid(wish.camera);
  return [
    ...(aperture[0] > aperture[1] ? ['aperture'] : []),
    ...(shutters.length === 0 ? ['shutter'] : []),
    ...(iso[0] > iso[1] ? ['ISO'] : []),
  ];
}

/** What is to be said about recipes, and about what stands in their way. */
export function recipeNotes(
  given: FillRecipesIn,
  wish: FillWish,
  shown: readonly Shown[],
  whyNot: readonly LimitInTheWay[],
): Remark[] {
  const notes: Remark[] = [];
  const settings = withoutMarks(wish);
  if (settings.length > 0) notes.push(note('no_mark_within_limits', { settings }));
  const bright = whyNot.find(({ limit }) => limit === 'ambient_too_bright');
  if (bright) notes.push(note('ambient_too_bright', { stops: bright.shortByStops ?? 0 }));
  notes.push(...outshoneNote(wish, whyNot));
  if (shown[0]?.sync === 'none' && shown[0].outcome.misses.subjectStops <= 1e-9 && whyNot.length === 0)
    notes.push(note('no_flash_needed'));
  const isMovable = ({ flash }: UsedFlash) => flash.nearM < flash.farM;
  if (shown.some(({ flashes }) => flashes.some(isMovable))) notes.push(note('flash_moved_in_steps'));
  return [...notes, ...motionNotes(given, wish, shown)];
}

/** What to mind on location. */
export function fillCautions({ scene }: FillSetup, hasFlashes: boolean): CautionCode[] {
  const cautions: CautionCode[] = hasFlashes ? ['flash_and_eyes', 'stands_and_wind'] : [];
  if (scene.backgroundEv100 >= SUNLIT_EV100) cautions.push('sun_and_optics');
  if (scene.backgroundEv100 <= NIGHT_EV100) cautions.push('night_and_place');
  return cautions;
}

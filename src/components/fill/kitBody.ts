import { guideNumberOf } from '../../../shared/contract/flashIn';
import type { Kit } from '../../../shared/contract/kit';
import { guideNumberOfEnergy } from '../../../shared/math/flashEnergy';
import type { FlashRole } from '../../../shared/math/fill/fillTypes';
import { pixelPitchUm } from '../../../shared/math/motionBlur';
import { valueAt, type Body } from '../../form/body';

type KitFlash = Kit['flashes'][number];

/** What stands in for efficacy where a kit does not tell it: the middle of what was read for studio systems. */
const USUAL_EFFICACY_LM_S_PER_WS = 30;
const FULL_FRAME_DIAGONAL_MM = Math.hypot(36, 24);
/** Where nobody said how far anything stands. */
const USUAL_DISTANCE_M = 2;
const USUAL_VIEW_M = 3;

/** What is taken out of a kit: places in its lists; `role` null leaves a flash in the bag. */
export interface KitPick {
  readonly camera: number;
  readonly lens: number;
  readonly flashes: readonly { readonly role: FlashRole | null; readonly modifier: string }[];
}

/** A way to use a flash: bare, by what was measured with a modifier, or with a modifier's loss. */
export interface ModifierChoice {
  readonly value: string;
  readonly title: string;
  readonly guideNumberM: number;
  readonly lossStops: number;
}

function bareGuideNumberM({ guideNumberM, energyWs, efficacyLmSPerWs }: KitFlash): number {
  if (guideNumberM !== undefined) return guideNumberOf(guideNumberM);
  const efficacy = efficacyLmSPerWs ?? USUAL_EFFICACY_LM_S_PER_WS;
  return guideNumberOfEnergy({ energyWs: energyWs ?? 0, efficacyLmSPerWs: efficacy, reflectorFactor: 1 });
}

/** The ways to use a flash of a kit; what was measured comes before what is reckoned. */
export function modifierChoices(kit: Kit, flash: KitFlash): ModifierChoice[] {
  const bare = bareGuideNumberM(flash);
  const measured = (flash.measured ?? []).map(({ modifier, guideNumberM }) => ({
    value: `measured ${modifier}`,
    title: `${modifier}, measured`,
    guideNumberM,
    lossStops: 0,
  }));
  const reckoned = kit.modifiers.map(({ name, lossStops }) => ({
    value: `loss ${name}`,
    title: name,
    guideNumberM: bare,
    lossStops,
  }));
  return [{ value: '', title: 'bare', guideNumberM: bare, lossStops: 0 }, ...measured, ...reckoned];
}

const ROLES: readonly FlashRole[] = ['key', 'rim', 'fill'];

/** What one takes first: the first camera and lens, the first flash as key, the next as rim, then as fill. */
export const firstPick = ({ flashes }: Kit): KitPick => ({
  camera: 0,
  lens: 0,
  flashes: flashes.map((_, i) => ({ role: ROLES[i] ?? null, modifier: '' })),
});

const known = (fields: Body): Body =>
  Object.fromEntries(Object.entries(fields).filter(([, value]) => value !== undefined));

function flashBody(kit: Kit, flash: KitFlash, role: FlashRole, modifier: string, distanceM: number): Body {
  const choices = modifierChoices(kit, flash);
  const { guideNumberM, lossStops } = choices.find(({ value }) => value === modifier) ?? {
    guideNumberM: bareGuideNumberM(flash),
    lossStops: 0,
  };
  return known({
    name: flash.name,
    role,
    guideNumberM: Number(guideNumberM.toFixed(2)),
    minPower: flash.minPower,
    powerStep: flash.powerStep,
    distanceM,
    lossStops,
    t05S: flash.t05S,
    control: flash.control,
    recycleFullS: flash.recycleFullS,
  });
}

/** Names that stand there twice get a number. */
function withOwnNames(flashes: readonly Body[]): Body[] {
  return flashes.map((flash, i) => {
    const before = flashes.slice(0, i).filter(({ name }) => name === flash.name).length;
    return before === 0 ? flash : { ...flash, name: `${String(flash.name)} ${before + 1}` };
  });
}

/** The request with camera, filters and flashes out of a kit; distances stay where they stood. */
export function withKit(body: Body, kit: Kit, pick: KitPick): Body {
  const camera = kit.cameras[pick.camera];
  const lens = kit.lenses[pick.lens];
  const before = (valueAt(body, ['flashes']) ?? []) as readonly Body[];
  const distanceOf = (place: number) => {
    const held = before[place]?.distanceM;
    return typeof held === 'number' ? held : USUAL_DISTANCE_M;
  };
  const used = kit.flashes.flatMap((flash, i) => {
    const { role, modifier } = pick.flashes[i] ?? { role: null, modifier: '' };
    return role === null ? [] : [{ flash, role, modifier }];
  });
  const flashes = used.map(({ flash, role, modifier }, i) =>
    flashBody(kit, flash, role, modifier, distanceOf(i)),
  );
  const filters = kit.filters.map(({ ndStops }) => ndStops);
  const limits = valueAt(body, ['camera']) as Body | undefined;
  const cameraBody = known({
    ...limits,
    ...(lens ? { apertureMin: lens.apertureMin, apertureMax: lens.apertureMax } : {}),
    ...(camera
      ? {
          isoMin: camera.isoMin,
          isoMax: camera.isoMax,
          shutterSlowest: camera.shutterSlowest,
          shutterFastest: camera.shutterFastest,
          syncSpeed: camera.syncSpeed,
          highSpeedSync: camera.highSpeedSync,
        }
      : {}),
    ndStops: filters.length > 0 ? filters : undefined,
  });
  return { ...body, camera: cameraBody, flashes: withOwnNames(flashes), ...viewOf(body, camera, lens) };
}

/** How the picture is framed, where the kit tells sensor and lens. */
function viewOf(body: Body, camera?: Kit['cameras'][number], lens?: Kit['lenses'][number]): Body {
  if (!camera || !lens) return {};
  const { sensorWidthMm, sensorHeightMm, pixelsAcross } = camera;
  const view = valueAt(body, ['view']) as Body | undefined;
  const cropFactor = FULL_FRAME_DIAGONAL_MM / Math.hypot(sensorWidthMm, sensorHeightMm);
  return {
    view: {
      focalLengthMm: lens.focalLengthMm,
      distanceM: view?.distanceM ?? USUAL_VIEW_M,
      pixelPitchUm: Number(pixelPitchUm(sensorWidthMm, pixelsAcross).toFixed(3)),
      cropFactor: Number(cropFactor.toFixed(3)),
    },
  };
}

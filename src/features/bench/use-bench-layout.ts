import { useMemo, useRef } from 'react';
import { findCase } from '#shared/circuit/effective.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { slipsOf } from '#shared/pictures/paper-slips.ts';
import type { RoutedLine } from '#shared/pictures/route.ts';
import type { TagForm, TagPlace } from '#shared/pictures/tag-slots.ts';
import type { Box } from '#shared/symbols/place.ts';
import { useRoutes } from '#src/components/schematic/use-routes.ts';
import { useFormat } from '#src/components/use-format.ts';
import { chooseFit, type PanelPlace } from './bench-fit.ts';
import { bodiesOf, growth, legsOf, type PlacedSlip, placeReadings, placeSlips, seatTags, type View, visibleBox } from './bench-layout.ts';
import { keepPlaces } from './bench-places.ts';
import { type ReadingSpec, readingSpecs } from './reading-specs.ts';
import { sameContent } from './steady.ts';
import { type TagSpec, tagSpecs } from './tag-specs.ts';
import { isFull, type TagState, tagState } from './tag-state.ts';

export interface BenchLayout {
  readonly routes: ReadonlyMap<string, RoutedLine>;
  readonly fit: View;
  /** Where the key of the pressure ink stands; null = no room beside the drawing. */
  readonly keyPlace: PanelPlace | null;
  readonly wheelPlace: PanelPlace | null;
  readonly grow: number;
  readonly small: boolean;
  readonly readings: readonly { readonly spec: ReadingSpec; readonly box: Box }[];
  readonly tags: readonly { readonly spec: TagSpec; readonly state: TagState; readonly place: TagPlace }[];
  /** Notes and part labels for which there is room. */
  readonly slips: readonly PlacedSlip[];
  readonly ink: number;
  /** Everything that can be turned, on the drawing or not. */
  readonly screws: readonly { readonly spec: TagSpec; readonly state: TagState }[];
}

export interface LayoutOptions {
  readonly width: number;
  readonly height: number;
  /** Zoom after the person moved the view; null = everything fitted in. */
  readonly zoom: number | null;
  readonly touch: boolean;
  readonly inHand: string | null;
  /** Pixels of the key, of the turn wheel (while shown) and of the zoom buttons. */
  readonly key: { readonly width: number; readonly height: number } | null;
  readonly wheel: { readonly width: number; readonly height: number } | null;
  readonly buttons: { readonly width: number; readonly height: number };
  /** The narrow arrangement of the demo: which tags and readings (with their widths) stand on the drawing. */
  readonly narrow?: { readonly tags: readonly string[]; readonly readings: Readonly<Record<string, number>> } | null;
}

/** Below this zoom tags are value chips, and readings move into the list. */
export const CHIP_ZOOM = 0.6;

/** What a chip says: the number alone on a small drawing, with its unit where a tag only lacks the room. */
export function chipWords({ value, unit }: { readonly value: string; readonly unit: string }, small: boolean): string {
  return small || unit === '' ? value : `${value} ${unit}`;
}

export function useBenchLayout(document: CircuitDocument, caseId: string, options: LayoutOptions): BenchLayout {
  const { width, height, zoom, touch, inHand, key, wheel, buttons, narrow = null } = options;
  const format = useFormat();
  const routes = useRoutes(document);
  const { components, lines, shafts } = document;

  const formerSpecs = useRef(new Map<string, TagSpec>());
  // biome-ignore lint/correctness/useExhaustiveDependencies: cases change no tag's place or name
  const specs = useMemo(() => {
    const next = tagSpecs({ ...document, components, lines, shafts }).map((spec) =>
      sameContent(formerSpecs.current.get(spec.address), spec),
    );
    formerSpecs.current = new Map(next.map((spec) => [spec.address, spec]));
    return next;
  }, [components, lines, shafts]);
  // biome-ignore lint/correctness/useExhaustiveDependencies: routes are laid anew exactly when something on the sheet moves; a value must not move tags
  const sheet = useMemo(() => {
    const bodies = bodiesOf(document, document.cases[0]?.id ?? caseId, routes);
    return {
      bodies,
      legs: legsOf(routes),
      readings: narrow ? narrowedReadings(readingSpecs(document), narrow.readings) : readingSpecs(document),
    };
  }, [routes]);

  // biome-ignore lint/correctness/useExhaustiveDependencies: the view is chosen when the sheet or its region changes, never while a screw is turned; panels count by their sizes
  const fit = useMemo(() => {
    const { bodies, legs, readings } = sheet;
    const wishes = specs.flatMap((spec) => {
      if (narrow && !narrow.tags.includes(spec.address)) return [];
      const state = tagState(document, caseId, spec);
      const chipText = state ? chipWords(format.quantity(state.value, spec.quantity), narrow !== null) : '';
      return state
        ? [{ spec, form: !narrow && isFull(document, spec, null) ? ('full' as const) : ('compact' as const), chipText, inHand: false }]
        : [];
    });
    return chooseFit({
      document,
      bodies,
      legs,
      readings,
      wishes,
      size: { width, height },
      touch,
      key,
      wheel,
      buttons,
      tight: narrow !== null,
    });
  }, [sheet, width, height, touch, key?.width, key?.height, wheel?.width, wheel?.height, buttons.width, buttons.height]);

  const seen = zoom ?? fit.view.zoom;
  const grow = growth(seen);
  const small = seen < CHIP_ZOOM;
  const frame = useMemo(() => (zoom === null && width > 0 ? visibleBox(fit.view, width, height) : undefined), [zoom, fit, width, height]);
  const blocked = useMemo(() => (zoom === null ? fit.blocked : []), [zoom, fit]);

  const readings = useMemo(() => {
    if (small) return new Map<string, Box>();
    return placeReadings(sheet.readings, sheet.bodies, sheet.legs, grow, blocked, frame);
  }, [sheet, grow, small, blocked, frame]);

  const former = useRef(new Map<string, TagState>());
  const states = useMemo(() => {
    const found: { spec: TagSpec; state: TagState; form: TagForm; chip: string }[] = [];
    for (const spec of specs) {
      const now = tagState(document, caseId, spec);
      if (!now) continue;
      const state = sameContent(former.current.get(spec.address), now);
      former.current.set(spec.address, state);
      const form: TagForm = small ? 'chip' : !narrow && isFull(document, spec, inHand) ? 'full' : 'compact';
      found.push({ spec, state, form, chip: chipWords(format.quantity(state.value, spec.quantity), small || narrow !== null) });
    }
    return found;
  }, [specs, document, caseId, inHand, small, format, narrow]);

  const kept = useRef<{ text: string; sheet: unknown; readings: unknown; view: string; places: ReadonlyMap<string, TagPlace> } | null>(
    null,
  );
  // In another view tags are seated anew; in the same one they stay.
  const view = `${grow} ${touch} ${JSON.stringify(frame)}`;
  const text = `${view} ${states
    .map(({ spec, form, chip }) => {
      const dragged = document.tagPlaces[spec.address];
      return `${spec.address}:${form}:${form === 'chip' ? chip.length : ''}:${inHand === spec.address}:${dragged ? `${dragged.dx},${dragged.dy}` : ''}`;
    })
    .join(' ')}`;
  // biome-ignore lint/correctness/useExhaustiveDependencies: `text` stands for all that decides where a tag stands
  const places = useMemo(() => {
    const before = kept.current;
    if (before && before.text === text && before.sheet === sheet && before.readings === readings) return before.places;
    const steady = before && before.sheet === sheet && before.view === view ? before.places : null;
    const seated = narrow ? states.filter(({ spec }) => narrow.tags.includes(spec.address)) : states;
    const wishes = seated.map(({ spec, form, chip }) => ({ spec, form, chipText: chip, inHand: inHand === spec.address }));
    const next = seatTags(
      wishes,
      document,
      sheet.bodies,
      sheet.legs,
      readings,
      { grow, touch, frame, blocked, wheel: options.wheel !== null },
      steady,
    );
    kept.current = { text, sheet, readings, view, places: next };
    keepPlaces(next);
    return next;
  }, [text, sheet, readings]);

  const { notes, labels } = document;
  const slips = useMemo(() => {
    if (small || (notes.length === 0 && labels.length === 0)) return [];
    const { bodies, legs } = sheet;
    const strings = [...places.values()].map(({ string }) => ({ a: string.from, b: string.to }));
    const taken = [
      ...[...bodies.byComponent.values()].flat(),
      ...bodies.words,
      ...blocked,
      ...readings.values(),
      ...[...places.values()].map((place) => place.box),
    ];
    return placeSlips(slipsOf({ notes, labels }), taken, [...legs, ...strings], grow, frame);
  }, [notes, labels, sheet, places, readings, blocked, frame, grow, small]);

  return {
    routes,
    slips,
    fit: fit.view,
    keyPlace: fit.keyPlace,
    wheelPlace: fit.wheelPlace,
    grow,
    small,
    readings: sheet.readings.flatMap((spec) => {
      const box = readings.get(spec.id);
      return box ? [{ spec, box }] : [];
    }),
    tags: states.flatMap(({ spec, state }) => {
      const place = places.get(spec.address);
      return place ? [{ spec, state, place }] : [];
    }),
    ink: findCase(document, caseId)?.ink ?? 0,
    screws: states,
  };
}

function narrowedReadings(specs: readonly ReadingSpec[], wanted: Readonly<Record<string, number>>): readonly ReadingSpec[] {
  return specs.flatMap((spec) => {
    const width = wanted[spec.id];
    return width === undefined ? [] : [{ ...spec, words: '', width }];
  });
}

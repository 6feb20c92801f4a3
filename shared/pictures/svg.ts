import { oilSpace } from './oil-space.ts';
import type { ThemeName } from './pressure-ink.ts';
import type { Ink, Picture, Shape, Stroke } from './shape.ts';
import { combine, groupMatrix, short, uprightMatrix } from './shape-transform.ts';
import { textureDefinition } from './textures.ts';
import { inkColour } from './theme.ts';

/** Drawing lists as a stand-alone SVG file with the theme's colours inline: for SVG and PNG export and for the server. */

export interface SvgOptions {
  /** Pixels per unit of the picture (10 for schematics drawn in modules). */
  readonly scale?: number;
  /** Ground behind the picture; absent = none. */
  readonly ground?: 'sheet' | 'white';
}

const fonts = {
  body: "'Archivo Variable', Archivo, 'Liberation Sans', sans-serif",
  reading: "B612, 'Archivo Variable', 'Liberation Sans', sans-serif",
} as const;

function escaped(text: string): string {
  return text.replace(/[&<>"]/g, (sign) => ({ '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' })[sign]!);
}

/** How markup is coloured and lettered. */
export interface MarkupStyle {
  readonly colour: (ink: Ink) => string;
  /** Turn and mirror of everything around, so that words stay upright. */
  readonly turn?: number;
  readonly mirror?: boolean;
  /** Factor for small words (below two units); 0 leaves them out. */
  readonly textScale?: number;
}

interface Context {
  readonly colour: (ink: Ink) => string;
  readonly turn: number;
  readonly mirror: boolean;
  readonly textScale: number;
  readonly textures: Map<string, string>;
}

function paint(shape: Stroke, context: Context): string {
  const parts: string[] = [];
  if (shape.texture) {
    const id = `${shape.texture}-${shape.stroke ?? 'ink'}`;
    context.textures.set(id, textureDefinition(id, shape.texture, context.colour(shape.stroke ?? 'ink')));
    parts.push(`fill="url(#${id})"`);
  } else {
    parts.push(`fill="${shape.fill ? context.colour(shape.fill) : 'none'}"`);
    if (shape.stroke && shape.stroke !== 'none') {
      parts.push(`stroke="${context.colour(shape.stroke)}" stroke-width="${short(shape.width ?? 1)}"`);
      parts.push(`stroke-linejoin="round" stroke-linecap="${shape.cap ?? 'round'}"`);
      if (shape.dash) parts.push(`stroke-dasharray="${shape.dash.map(short).join(' ')}"`);
    }
  }
  if (shape.opacity !== undefined) parts.push(`opacity="${short(shape.opacity)}"`);
  if (shape.role) parts.push(`data-role="${escaped(shape.role)}"`);
  return parts.join(' ');
}

function textElement(shape: Extract<Shape, { type: 'text' }>, context: Context): string {
  const factor = shape.size < 2 ? context.textScale : 1;
  if (factor === 0) return '';
  const anchor = shape.anchor ?? 'start';
  const size = shape.size * factor;
  const y = shape.y + (size - shape.size) * 0.36;
  const upright = uprightMatrix(context.turn, context.mirror, shape.x, shape.y - shape.size * 0.36);
  const turned = shape.turn ? ` transform="rotate(${short(shape.turn)} ${short(shape.x)} ${short(shape.y)})"` : '';
  return (
    `<text x="${short(shape.x)}" y="${short(y)}" font-family="${fonts[shape.font ?? 'body']}" font-size="${short(size)}"` +
    ` font-weight="${shape.weight ?? 500}" text-anchor="${anchor}" fill="${context.colour(shape.fill ?? 'ink')}"` +
    `${shape.opacity === undefined ? '' : ` opacity="${short(shape.opacity)}"`}${upright ? ` transform="${upright}"` : turned}>` +
    `${escaped(shape.text)}</text>`
  );
}

function element(shape: Shape, context: Context): string {
  switch (shape.type) {
    case 'line':
      return `<line x1="${short(shape.x1)}" y1="${short(shape.y1)}" x2="${short(shape.x2)}" y2="${short(shape.y2)}" ${paint(shape, context)}/>`;
    case 'rect':
      return `<rect x="${short(shape.x)}" y="${short(shape.y)}" width="${short(Math.max(0, shape.w))}" height="${short(Math.max(0, shape.h))}"${shape.radius ? ` rx="${short(shape.radius)}"` : ''} ${paint(shape, context)}/>`;
    case 'circle':
      return `<circle cx="${short(shape.x)}" cy="${short(shape.y)}" r="${short(shape.r)}" ${paint(shape, context)}/>`;
    case 'polyline':
      return `<${shape.closed ? 'polygon' : 'polyline'} points="${Array.from(shape.points, short).join(' ')}" ${paint(shape, context)}/>`;
    case 'path':
      return `<path d="${escaped(shape.d)}" ${paint(shape, context)}/>`;
    case 'text':
      return textElement(shape, context);
    case 'oil':
      return oilSpace(shape, null, 1)
        .map((part) => element(part, context))
        .join('');
    case 'group': {
      const inner = { ...context, ...combine(context, shape) };
      const body = shape.shapes.map((part) => element(part, inner)).join('');
      return `<g transform="matrix(${groupMatrix(shape).map(short).join(' ')})">${body}</g>`;
    }
  }
}

/** Markup of a drawing list, without the file around it; textures are left to the file. */
export function shapesMarkup(shapes: readonly Shape[], style: MarkupStyle): string {
  const context: Context = {
    colour: style.colour,
    turn: style.turn ?? 0,
    mirror: style.mirror ?? false,
    textScale: style.textScale ?? 1,
    textures: new Map(),
  };
  return shapes.map((shape) => element(shape, context)).join('');
}

/** One SVG file. Words keep their font names; where the fonts are missing the reader's own sans serif is used. */
export function pictureToSvg(picture: Picture, theme: ThemeName, options: SvgOptions = {}): string {
  const scale = options.scale ?? 1;
  const context: Context = { colour: (ink) => inkColour(ink, theme), turn: 0, mirror: false, textScale: 1, textures: new Map() };
  const body = picture.shapes.map((shape) => element(shape, context)).join('\n');
  const ground =
    options.ground === undefined
      ? ''
      : `<rect width="${short(picture.width)}" height="${short(picture.height)}" fill="${options.ground === 'white' ? '#ffffff' : inkColour('sheet', theme)}"/>\n`;
  const defs = context.textures.size > 0 ? `<defs>${[...context.textures.values()].join('')}</defs>\n` : '';
  return (
    `<svg xmlns="http://www.w3.org/2000/svg" width="${short(picture.width * scale)}" height="${short(picture.height * scale)}"` +
    ` viewBox="0 0 ${short(picture.width)} ${short(picture.height)}" role="img"><title>${escaped(picture.title)}</title>\n` +
    `${defs}${ground}${body}\n</svg>\n`
  );
}

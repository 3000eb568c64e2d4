import { z } from 'zod';
import { shapeSentence } from '#client/app/shape-words.ts';
import { fitCst } from '#geometry/contour/fitting.ts';
import { ShapeError } from '#geometry/shapes/error.ts';
import { parseDesignation } from '#geometry/shapes/naca4.ts';
import { checkShape, outlineOf, type Shape } from '#geometry/shapes/shape.ts';
import { purposeSchema, sectionNameSchema } from '#server/contracts/common.ts';

const starts = ['designation', 'values', 'free'] as const;
export type Start = (typeof starts)[number];

/** What the dialog asks for; the shape that comes of it is checked by the shape's own schema. */
export const newSectionFormSchema = z.object({
  name: sectionNameSchema,
  purpose: purposeSchema,
  start: z.enum(starts),
  designation: z.string(),
  maxCamber: z.number(),
  maxCamberPosition: z.number(),
  maxThickness: z.number(),
  trailingEdge: z.enum(['open', 'closed']),
  order: z.number(),
});
export type NewSectionForm = z.infer<typeof newSectionFormSchema>;

export const NEW_SECTION: NewSectionForm = {
  name: '',
  purpose: '',
  start: 'designation',
  designation: '2412',
  maxCamber: 0.02,
  maxCamberPosition: 0.4,
  maxThickness: 0.12,
  trailingEdge: 'open',
  order: 8,
};

/** The fields that can be at fault for a shape. */
type ShapeField = 'designation' | 'maxCamber' | 'maxCamberPosition' | 'maxThickness' | 'order';
export type StartingShape =
  | {
      readonly shape: Shape;
      /** Largest normal distance of a free form from the section it began as, fractions of chord. */ readonly residual:
        number | null;
    }
  | { readonly shape: null; readonly field: ShapeField; readonly message: string };

type ShapeChoice = Omit<NewSectionForm, 'name' | 'purpose'>;

/** The shape that a new section begins with, or the field that stands in its way. */
export function startingShape(form: ShapeChoice): StartingShape {
  const values = form.start === 'values' ? form : parseDesignation(form.designation);
  if (values === null) {
    return { shape: null, field: 'designation', message: designationSentence(form.designation) };
  }
  const { maxCamber, maxCamberPosition, maxThickness } = values;
  try {
    const digits = checkShape({
      kind: 'naca4',
      maxCamber,
      maxCamberPosition,
      maxThickness,
      trailingEdge: form.trailingEdge,
    });
    if (form.start !== 'free') return { shape: digits, residual: null };
    const fit = fitCst(outlineOf(digits), { orderUpper: form.order, orderLower: form.order });
    return { shape: checkShape(fit.shape), residual: fit.residual.largest };
  } catch (error) {
    if (error instanceof ShapeError) return { shape: null, ...faultOf(error, form.start) };
    throw error;
  }
}

function designationSentence(text: string): string {
  return /^\D*\d{4}\s*$/.test(text)
    ? 'No section has these digits: the last two are a thickness of 01 to 40, and camber needs a position of 1 to 9.'
    : 'Type the four digits of a designation, such as 2412.';
}

function faultOf(error: ShapeError, start: Start): { field: ShapeField; message: string } {
  const issue = error.issues[0];
  const message = shapeSentence(issue?.message ?? error.message);
  if (start !== 'values') return { field: 'designation', message };
  const field =
    (['maxCamber', 'maxCamberPosition'] as const).find((name) => name === issue?.path) ?? 'maxThickness';
  return { field, message };
}

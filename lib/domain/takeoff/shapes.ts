import Decimal from 'decimal.js';
import { type Quantity, quantity } from '../money/money';

/**
 * Volumes of the plain shapes, in the cube of whatever length unit all dimensions share: feet in
 * give cubic feet.
 */

const PI = Decimal.acos(-1);

/** Slab, footing, rectangular column or pier: length × width × thickness. */
export function box(length: Quantity, width: Quantity, thickness: Quantity): Quantity {
  return quantity(length.times(width).times(thickness));
}

/** A wall, haunch or thickened edge of trapezoid section along a length. */
export function trapezoidRun(
  section: { readonly top: Quantity; readonly bottom: Quantity; readonly height: Quantity },
  length: Quantity,
): Quantity {
  const area = section.top.plus(section.bottom).dividedBy(2).times(section.height);
  return quantity(area.times(length));
}

/** A round pier or column. */
export function cylinder(diameter: Quantity, height: Quantity): Quantity {
  const radius = diameter.dividedBy(2);
  return quantity(radius.pow(2).times(PI).times(height));
}

/** A bell or stepped footing between two parallel faces: h/3 (A + B + √(AB)). */
export function frustum(areaA: Quantity, areaB: Quantity, height: Quantity): Quantity {
  const mean = areaA.times(areaB).sqrt();
  return quantity(areaA.plus(areaB).plus(mean).times(height).dividedBy(3));
}

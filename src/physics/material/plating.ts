import { add, type Complex, complex, div, mul, scale, tanh } from '../../numerics/complex.js';
import { halfSpaceImpedance, skinDepth } from './copper.js';

export interface MetalLayer {
  /** S/m, > 0 */
  readonly conductivity: number;
  /** m, > 0 */
  readonly thickness: number;
  readonly relativePermeability: number;
}

/**
 * Surface impedance of copper under flat finish layers, ohm, referred to the outermost metal surface.
 *
 * From the copper (a half space) outward each layer is a short length of lossy line:
 * Z ← zc (Z + zc tanh γt)/(zc + Z tanh γt), with zc = (1 + j)Rs and γ = (1 + j)/δ of the layer.
 * Source: transmission-line analogy of plane waves in layered conductors, any text; exact for plane layers. The layers
 * are taken as following the copper without interdiffusion.
 *
 * @param base   conductivity of the copper, S/m, > 0
 * @param layers from the copper outward; none for bare copper
 */
export function platedImpedance(frequency: number, base: number, layers: readonly MetalLayer[]): Complex {
  return layers.reduce(
    (inner, layer) => {
      if (!(layer.thickness > 0))
        throw new RangeError(`a finish layer needs a positive thickness, got ${layer.thickness}`);
      const zc = halfSpaceImpedance(frequency, layer.conductivity, layer.relativePermeability);
      const delta = skinDepth(frequency, layer.conductivity, layer.relativePermeability);
      const th = tanh(scale(complex(1, 1), layer.thickness / delta));
      return mul(zc, div(add(inner, mul(zc, th)), add(zc, mul(inner, th))));
    },
    halfSpaceImpedance(frequency, base),
  );
}

import type { Arena, Kernels } from "./kernels.ts";
import { vectorModule } from "./vectorModule.ts";

/** null where WebAssembly or its vectors are missing, or a page's security policy forbids it. */
export function vectorArena(): Arena | null {
  const kernels = instantiated();
  if (kernels === null) return null;
  const { memory, exports } = kernels;
  let values = new Float64Array(memory.buffer);
  const numbers = (length: number): Float64Array => {
    if (values.length < length) {
      memory.grow(Math.ceil(((length - values.length) * bytesPerNumber) / bytesPerPage));
      values = new Float64Array(memory.buffer);
    }
    return values;
  };
  return { numbers, kernels: byIndex(exports) };
}

const bytesPerNumber = 8;
const bytesPerPage = 65536;

type Exports = Readonly<Record<keyof Kernels, (...numbers: number[]) => void>>;

function instantiated(): { readonly memory: WebAssembly.Memory; readonly exports: Exports } | null {
  if (typeof WebAssembly === "undefined") return null;
  const bytes = Uint8Array.from(atob(vectorModule), (letter) => letter.charCodeAt(0));
  if (!WebAssembly.validate(bytes)) return null;
  try {
    const memory = new WebAssembly.Memory({ initial: 1 });
    const instance = new WebAssembly.Instance(new WebAssembly.Module(bytes), { env: { memory } });
    return { memory, exports: instance.exports as unknown as Exports };
  } catch {
    // A content security policy without "wasm-unsafe-eval" shows itself only here.
    return null;
  }
}

/** The module counts in bytes. */
const byIndex = (exports: Exports): Kernels => ({
  reflectRows: ({ triangle, block, size, rows, stride }) =>
    exports.reflectRows(triangle * bytesPerNumber, block * bytesPerNumber, size, rows, stride),
  substitute: ({ triangle, block, size, rows, stride }) =>
    exports.substitute(triangle * bytesPerNumber, block * bytesPerNumber, size, rows, stride),
  addProducts: ({ left, count, right, next, rows, stride, sums, nextSums }) =>
    exports.addProducts(
      left * bytesPerNumber,
      count,
      right * bytesPerNumber,
      next * bytesPerNumber,
      rows,
      stride,
      sums * bytesPerNumber,
      nextSums * bytesPerNumber,
    ),
  multiply: ({ x, y, product, rows }) =>
    exports.multiply(x * bytesPerNumber, y * bytesPerNumber, product * bytesPerNumber, rows),
  addSquares: ({ block, size, rows, stride, sums }) =>
    exports.addSquares(block * bytesPerNumber, size, rows, stride, sums * bytesPerNumber),
  rotateRows: ({ triangle, floors, block, size, rows, raised }) =>
    exports.rotateRows(
      triangle * bytesPerNumber,
      floors * bytesPerNumber,
      block * bytesPerNumber,
      size,
      rows,
      raised * bytesPerNumber,
    ),
  subtractMultiple: ({ high, low, x, rows, factor, factorLow }) =>
    exports.subtractMultiple(high * bytesPerNumber, low * bytesPerNumber, x * bytesPerNumber, rows, factor, factorLow),
  addInnerProduct: ({ sum, x, high, low, rows }) =>
    exports.addInnerProduct(
      sum * bytesPerNumber,
      x * bytesPerNumber,
      high * bytesPerNumber,
      low * bytesPerNumber,
      rows,
    ),
});

import { IDependencyManagerService, IFormulaDependencyGenerator } from "@univerjs/engine-formula";
import type { Grid } from "./grid.ts";

/**
 * At every run the engine writes down anew what each formula depends on, and keeps what it wrote at all the runs before:
 * a workbook that is worked on would take ever more memory. What it wrote before is forgotten first.
 */
export function forgetRuns({ injector }: Grid): void {
  const written = injector.get(IDependencyManagerService);
  const generator = injector.get(IFormulaDependencyGenerator);
  const generate = generator.generate.bind(generator);
  generator.generate = (isTreeModel) => {
    written.reset();
    return generate(isTreeModel);
  };
}

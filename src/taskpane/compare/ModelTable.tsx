import type { ReactNode } from "react";
import type { ComparedModel } from "../../sheet/comparison.ts";
import { useTableLook } from "./tableLook.ts";

export interface ModelsProps {
  readonly models: readonly ComparedModel[];
}

interface ModelTableProps extends ModelsProps {
  /** What the table holds, for those who do not see it. */
  readonly label: string;
  /** The same of the box that it scrolls in. */
  readonly region: string;
  readonly children: ReactNode;
}

/** A table with one column a model, in a box that scrolls where there are many. */
export function ModelTable({ models, label, region, children }: ModelTableProps): ReactNode {
  const look = useTableLook();
  return (
    <div className={look.box} tabIndex={0} role="region" aria-label={region}>
      <table className={look.table} aria-label={label}>
        <thead>
          <tr>
            <td />
            {models.map(({ name }) => (
              <th key={name} scope="col" className={look.model}>
                {name}
              </th>
            ))}
          </tr>
        </thead>
        {children}
      </table>
    </div>
  );
}

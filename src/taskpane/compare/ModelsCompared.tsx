import type { ReactNode } from "react";
import { comparedLines } from "../../sheet/comparison.ts";
import { ModelTable, type ModelsProps } from "./ModelTable.tsx";
import { useTableLook } from "./tableLook.ts";

/** The choice in force, the rows and the fit of every model. */
export function ModelsCompared({ models }: ModelsProps): ReactNode {
  const look = useTableLook();
  return (
    <ModelTable models={models} label="The models as a whole" region="Choice, rows and fit of each model">
      <tbody>
        {comparedLines(models).map(({ label, values }) => (
          <tr key={label}>
            <th scope="row" className={look.label}>
              {label}
            </th>
            {values.map((value, index) => (
              <td key={models[index]!.name} className={look.cell}>
                {typeof value === "number" ? written(value) : value}
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </ModelTable>
  );
}

const fourDigits = new Intl.NumberFormat("en-US", { maximumSignificantDigits: 4 });

/** Counts in full, figures of fit to four digits. */
const written = (value: number): string =>
  Number.isInteger(value) ? value.toLocaleString("en-US") : fourDigits.format(value).replace("-", "\u2212");

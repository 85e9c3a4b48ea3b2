import type { ReactNode } from "react";
import { comparedLines } from "../../sheet/comparison.ts";
import type { ModelsProps } from "./DriversCompared.tsx";
import { useTableLook } from "./tableLook.ts";

/** The choice in force, the rows and the fit of every model. */
export function ModelsCompared({ models }: ModelsProps): ReactNode {
  const look = useTableLook();
  return (
    <div className={look.box} tabIndex={0} role="region" aria-label="Choice, rows and fit of each model">
      <table className={look.table} aria-label="The models as a whole">
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
      </table>
    </div>
  );
}

const fourDigits = new Intl.NumberFormat("en-US", { maximumSignificantDigits: 4 });

/** Counts in full, figures of fit to four digits. */
const written = (value: number): string =>
  Number.isInteger(value) ? value.toLocaleString("en-US") : fourDigits.format(value).replace("-", "\u2212");

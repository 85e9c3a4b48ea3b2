import { mergeClasses } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { DriverAnswer } from "../../core/answer/answer.ts";
import { confidenceInWords } from "../../core/answer/wording.ts";
import { type ComparedDriver, type ComparedModel, comparedDrivers } from "../../sheet/comparison.ts";
import { standardErrorInWords, writerFor } from "../answer/driverFigures.ts";
import { FirmnessMark } from "../answer/FirmnessMark.tsx";
import { pFigure } from "../parts/pFigure.ts";
import { ModelTable, type ModelsProps } from "./ModelTable.tsx";
import { useTableLook } from "./tableLook.ts";

/** Each driver with its figures under every model. */
export const DriversCompared = ({ models }: ModelsProps): ReactNode => (
  <ModelTable models={models} label="Drivers of the models" region="Drivers in rows, models in columns">
    {comparedDrivers(models).map((driver) => (
      <Driver key={driver.term} driver={driver} models={models} />
    ))}
  </ModelTable>
);

type Line = readonly [label: string, figure: (driver: DriverAnswer, model: ComparedModel) => ReactNode];

const lines = (confidence: string): readonly Line[] => [
  ["coefficient", (driver) => <strong>{writerFor(driver)(driver.coefficient)}</strong>],
  ["standard error", (driver) => standardErrorInWords(driver.standardError)],
  [`${confidence} interval`, (driver) => `${writerFor(driver)(driver.low)} to ${writerFor(driver)(driver.high)}`],
  ["p-value", (driver, { answer }) => pFigure(driver.pValue, answer.options.level)],
  ["firm or leaning", (driver) => <Firmness driver={driver} />],
];

const Firmness = ({ driver }: { readonly driver: DriverAnswer }): ReactNode => (
  <>
    <FirmnessMark firmness={driver.firmness} /> {driver.firmness.kind}
  </>
);

function Driver({ driver, models }: ModelsProps & { readonly driver: ComparedDriver }): ReactNode {
  const look = useTableLook();
  const levels = new Set(models.map(({ answer }) => confidenceInWords(answer.options.level)));
  const confidence = levels.size === 1 ? [...levels][0]! : "";
  return (
    <tbody>
      <tr>
        <th scope="rowgroup" colSpan={models.length + 1} className={look.driver}>
          {driver.term}
        </th>
      </tr>
      {lines(confidence).map(([label, figure], index) => (
        <tr key={label}>
          <th scope="row" className={mergeClasses(look.label, look.short)}>
            {label.trim()}
          </th>
          {driver.in.map((found, place) => (
            <td key={models[place]!.name} className={look.cell}>
              {found === null ? (index === 0 ? "not in it" : "") : figure(found, models[place]!)}
            </td>
          ))}
        </tr>
      ))}
    </tbody>
  );
}

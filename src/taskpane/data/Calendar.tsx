import { Checkbox, makeStyles } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { CalendarDriver } from "../../core/design/model.ts";
import { Disclosure } from "../parts/Disclosure.tsx";
import { usePane } from "../paneContext.ts";

const useStyles = makeStyles({ fields: { display: "grid", justifyItems: "start" } });

const drivers: readonly (readonly [CalendarDriver, string])[] = [
  ["trend", "a trend"],
  ["month indicators", "an indicator for each month but one"],
  ["quarter indicators", "an indicator for each quarter but one"],
];

/** Drivers made from time alone, where rows run through it. */
export function Calendar(): ReactNode {
  const styles = useStyles();
  const { state, dispatch } = usePane();
  const { setup } = state;
  if (setup === null || setup.rows === "cases") return null;
  const { calendar } = setup;
  const change = (driver: CalendarDriver, chosen: boolean): void => {
    const others = calendar.filter((one) => one !== driver);
    dispatch({ kind: "setup changed", change: { calendar: chosen ? [...others, driver] : others } });
  };
  const names = drivers.filter(([driver]) => calendar.includes(driver)).map(([driver]) => driver);
  return (
    <Disclosure label={`Drivers made from time: ${names.length === 0 ? "none" : names.join(", ")}`}>
      <div className={styles.fields}>
        {drivers.map(([driver, words]) => (
          <Checkbox
            key={driver}
            label={words}
            checked={calendar.includes(driver)}
            onChange={(_, { checked }) => change(driver, checked === true)}
          />
        ))}
      </div>
    </Disclosure>
  );
}

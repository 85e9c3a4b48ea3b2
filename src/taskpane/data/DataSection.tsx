import { Button, makeStyles, mergeClasses, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { HelpHead } from "../help/HelpHead.tsx";
import { useType } from "../look/type.ts";
import { Disclosure } from "../parts/Disclosure.tsx";
import { counted } from "../../core/problem/spots.ts";
import { SectionTitle } from "../parts/SectionTitle.tsx";
import { usePane } from "../paneContext.ts";
import { KeptHere } from "../setups/KeptHere.tsx";
import { Calendar } from "./Calendar.tsx";
import { ChangedNotice } from "./ChangedNotice.tsx";
import { ColumnList } from "./ColumnList.tsx";
import { HiddenRows } from "./HiddenRows.tsx";
import { LostColumns } from "./LostColumns.tsx";
import { PlaceChooser } from "./PlaceChooser.tsx";
import { RowsBelow } from "./RowsBelow.tsx";
import { RowsAre } from "./RowsAre.tsx";
import { WhatIsUsed } from "./WhatIsUsed.tsx";
import { WayToAnswer } from "./WayToAnswer.tsx";

/** From cells to a question: which data, what each column is, what rows are to each other. */
export function DataSection(): ReactNode {
  const type = useType();
  const { data, setup } = usePane().state;
  if (data === null || setup === null) return <FirstRun />;
  const { address, source, notes } = data;
  return (
    <>
      <SectionTitle>{address}</SectionTitle>
      <p className={type.remark}>
        {counted(source.rowCount, "row")}, {counted(source.columns.length, "column")}
      </p>
      {notes.map((note) => (
        <p key={note} className={type.remark}>
          {note}
        </p>
      ))}
      <ChangedNotice />
      <LostColumns />
      <RowsBelow />
      <Disclosure key={address} label="Choose other data">
        <PlaceChooser />
      </Disclosure>
      <h2 className={type.head}>Columns</h2>
      <ColumnList key={`columns of ${address}`} />
      <HelpHead about="groups" asks="What are groups?">
        Rows are
      </HelpHead>
      <RowsAre />
      <HiddenRows />
      <WhatIsUsed />
      <Calendar />
      <WayToAnswer />
      <KeptHere />
    </>
  );
}

function FirstRun(): ReactNode {
  const type = useType();
  return (
    <>
      <SectionTitle>What holds, and how firmly?</SectionTitle>
      <p className={type.verdict}>
        Footing fits a regression to your cells, tests which standard errors may be used, and says in plain words what
        holds for each driver.
      </p>
      <p className={type.remark}>Select the columns with their headings, or one cell among them.</p>
      <PlaceChooser />
      <Sample />
      <KeptHere />
      <p className={type.footnote}>All of it is computed on this computer. Nothing is sent anywhere.</p>
    </>
  );
}

const useStyles = makeStyles({ sample: { marginTop: tokens.spacingVerticalL } });

/** For someone who has no data at hand, or wants to see first what comes out. */
function Sample(): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { state, commands } = usePane();
  return (
    <>
      <p className={mergeClasses(type.remark, styles.sample)}>
        No data at hand? Invented figures of 96 months go onto a new sheet of their own.
      </p>
      <Button size="small" disabledFocusable={state.busy !== null} onClick={commands.insertSample}>
        Insert sample data
      </Button>
    </>
  );
}

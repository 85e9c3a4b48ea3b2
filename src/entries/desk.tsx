import { createRoot } from "react-dom/client";
import { DeskPage } from "../desk/page/DeskPage.tsx";
import "../desk/page/desk.css";
import type { FunctionsMetadata } from "../desk/workbook/metadata.ts";

const place = document.getElementById("desk");
if (place === null) throw new Error("The page has no place for the desk.");

/** The add-in's description of its functions lies where its manifest says: beside the pane. */
const answer = await fetch("../functions.json");
const functions = (await answer.json()) as FunctionsMetadata;

createRoot(place).render(<DeskPage functions={functions} />);

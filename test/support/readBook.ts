import type { Book } from "../../src/core/review/book.ts";
import { type Asked, type BookClaims, claimsOf } from "../../src/core/review/claimsOf.ts";
import type { BookData } from "../../src/desk/book/bookData.ts";
import { errand, openDeskHost } from "./deskHost.ts";
import { must } from "./sheet.ts";

/** A workbook on the desk, read as a review reads it. */
export async function readOnDesk(data: BookData): Promise<Book> {
  const { desk, host } = await openDeskHost(data);
  const book = must(await host.readBook(errand()));
  desk.close();
  return book;
}

export const everything: Asked = { pointed: null, sheet: null };

export const claimsIn = (book: Book, asked: Partial<Asked> = {}): BookClaims =>
  must(claimsOf(book, { ...everything, ...asked }, () => undefined));

#!/usr/bin/env bash
# Makes the workbooks of test/reference/workbooks that another program has saved: R's data sets airquality and longley,
# with a title above the headings, blank rows, text for missing values, real dates, a number typed as text and a note
# below, written by LibreOffice. Needs Debian's r-base-core and libreoffice-calc; run from the project's root.
set -euo pipefail
folder=$(mktemp -d)
out="$PWD/test/reference/workbooks"
R_SCRIPT='
folder <- commandArgs(TRUE)[1]
write <- function(rows, name) writeLines(rows, file.path(folder, name))
cells <- function(row) paste(ifelse(is.na(row), "NA", row), collapse = ",")
a <- airquality
a$Date <- sprintf("1973-%02d-%02d", a$Month, a$Day)
a <- a[, c("Date", "Ozone", "Solar.R", "Wind", "Temp")]
rows <- apply(a, 1, function(row) cells(trimws(row)))
write(c("Air quality measurements,,,,", ",,,,", "Date,Ozone,Solar.R,Wind,Temp", rows[1:60], ",,,,", rows[61:153], ",,,,",
        "Source: R datasets,,,,"), "airquality.csv")
bad <- rows; bad[30] <- sub(",[^,]*$", ",n.k.", bad[30])
write(c("Date,Ozone,Solar.R,Wind,Temp", bad), "airquality-text.csv")
l <- longley[, c("Year", "Employed", "GNP.deflator", "GNP", "Unemployed", "Armed.Forces", "Population")]
write(c("Employment 1947-1962,,,,,,", ",,,,,,", paste(names(l), collapse = ","), apply(l, 1, function(row) cells(trimws(row)))), "longley.csv")
'
Rscript -e "$R_SCRIPT" "$folder"
cd "$folder"
soffice --headless --infilter="CSV:44,34,76,1,,0,false,true" --convert-to xlsx --outdir "$out" airquality.csv airquality-text.csv longley.csv

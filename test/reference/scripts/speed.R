# Times lm, vcovHC, NeweyWest, bptest and bgtest on a matrix of doubles, column by column, the outcome first.
# Called by speedAgainstR.ts: Rscript speed.R FILE ROWS DRIVERS LAGS
suppressPackageStartupMessages({ library(sandwich); library(lmtest) })
given <- commandArgs(trailingOnly = TRUE)
rows <- as.integer(given[2]); drivers <- as.integer(given[3]); lags <- as.integer(given[4])
values <- matrix(readBin(given[1], "double", rows * (drivers + 1)), rows)
data <- as.data.frame(values)
names(data) <- c("y", paste0("x", seq_len(drivers)))
seconds <- system.time({
  fit <- lm(y ~ ., data)
  white <- vcovHC(fit, "HC3")
  neweyWest <- NeweyWest(fit, lag = lags, prewhite = FALSE, adjust = TRUE)
  koenker <- bptest(fit)
  breuschGodfrey <- bgtest(fit, order = 2)
})[["elapsed"]]
figures <- c(seconds, coef(fit)[2], sqrt(white[2, 2]), sqrt(neweyWest[2, 2]), koenker$statistic, breuschGodfrey$statistic)
cat(formatC(figures, digits = 17, format = "g"), sep = "\n")

# Times plm on a panel of five columns of doubles: company, year, outcome, two regressors. Says when it is ready, then
# prints the milliseconds of one run for each line it reads.
suppressMessages(library(plm))
arguments <- commandArgs(TRUE)
rows <- as.integer(arguments[2])
values <- matrix(readBin(arguments[1], 'double', 5 * rows), rows)
panel <- data.frame(company = values[, 1], year = values[, 2], y = values[, 3], a = values[, 4], b = values[, 5])
once <- function() {
  start <- proc.time()[['elapsed']]
  fit <- plm(y ~ a + b, panel, index = c('company', 'year'), model = 'within')
  parts <- list(vcov(fit), vcovHC(fit, method = 'arellano', type = 'HC0', cluster = 'group'), fixef(fit))
  stopifnot(length(parts) == 3)
  1000 * (proc.time()[['elapsed']] - start)
}
input <- file('stdin', 'r')
cat('ready\n')
while (length(readLines(input, 1)) > 0) cat(once(), '\n', sep = '')

# The sample of a case, read from its CSV by the rules in words: lag by calendar years, rows with a missing value
# dropped, companies with a single row set apart, logarithms last.

missing_cells <- c("", "NA", "N/A", "n/a", "#N/A", "-", "–", ".", "..")

read_case <- function(case, root) {
  rows <- read.csv(file.path(root, case$file), check.names = FALSE, na.strings = missing_cells, encoding = "UTF-8")
  regressors <- unlist(case$regressors)
  company <- as.character(rows[[case$company]])
  year <- rows[[case$year]]
  y <- as.numeric(rows[[case$outcome]])
  x <- vapply(rows[regressors], as.numeric, numeric(nrow(rows)))
  if (case$lag == 1) x <- x[match(paste(company, year - 1), paste(company, year)), , drop = FALSE]
  complete <- is.finite(y) & is.finite(rowSums(x))
  counts <- table(company[complete])
  stays <- complete & company %in% names(counts)[counts > 1]
  levels <- panel_of(company[stays], year[stays], y[stays], unname(x[stays, , drop = FALSE]))
  if (case$form == "levels") levels else modifyList(levels, list(y = log(levels$y), x = log(levels$x), levels = levels))
}

# Numbers as a JSON array of 17 significant digits, more than jsonlite writes; what is no number is null.
exact_json <- function(values) {
  values <- as.numeric(values)
  digits <- ifelse(is.finite(values), sprintf("%.17g", values), "null")
  structure(paste0("[", paste(digits, collapse = ","), "]"), class = "json")
}

# What is printed and frozen of one figure: what made it, its numbers, and the size that differences are held against,
# one for all numbers or one each.
figure <- function(call, value, scale = 0) {
  scale <- rep_len(as.numeric(scale), length(value))
  scale[!is.finite(scale)] <- 0
  result <- list(call = call, value = exact_json(value))
  if (any(scale > 0)) result$scale <- if (length(unique(scale)) == 1) scale[1] else exact_json(scale)
  result
}

# A figure that R itself refuses is a null on both sides; its message is kept.
try_figure <- function(call, compute) {
  tryCatch(compute(), error = function(refusal) {
    list(call = call, value = exact_json(NA), refused = conditionMessage(refusal))
  })
}

# Flags, windows, measures and distances of the panel desk. From the project's root: Rscript tools/reference/panel_data.R
# Needs jsonlite and robustbase (Debian: r-cran-jsonlite, r-cran-robustbase).

suppressMessages(library(robustbase))
folder <- "backend/stats/golden"

panel <- function(name) {
  rows <- read.csv(file.path(folder, paste0(name, ".csv")))
  data.frame(company = rows$company, year = rows$year, marketValue = rows$value, capex = rows$inv,
             bookEquity = rows$capital)
}
columns <- c("marketValue", "capex", "bookEquity")

# Modified z of log changes between consecutive years, by stats::mad; spread at least 0.05, change at least by half.
jumps <- function(rows) {
  found <- list()
  for (name in unique(rows$company)) for (column in columns) {
    own <- rows[rows$company == name, ]
    own <- own[order(own$year), ]
    before <- match(own$year - 1, own$year)
    change <- log(own[[column]] / own[[column]][before])
    known <- which(is.finite(change))
    if (length(known) < 5) next
    z <- (change - median(change[known])) / max(mad(change[known]), 0.05)
    for (i in known) if (abs(z[i]) > 3.5 && abs(change[i]) >= log(1.5))
      found[[length(found) + 1]] <- list(company = name, year = own$year[i], column = column, score = z[i],
                                         ratio = exp(change[i]), usualRatio = exp(median(change[known])))
  }
  found
}

# Modified z of log ratios to book equity among the companies of a year; spread at least 0.2, 8 companies at least.
outliers <- function(rows) {
  found <- list()
  for (year in sort(unique(rows$year))) for (column in c("marketValue", "capex")) {
    year_rows <- rows[rows$year == year & rows[[column]] > 0 & rows$bookEquity > 0, ]
    if (nrow(year_rows) < 8) next
    ratio <- log(year_rows[[column]] / year_rows$bookEquity)
    z <- (ratio - median(ratio)) / max(mad(ratio), 0.2)
    for (i in which(abs(z) > 3.5))
      found[[length(found) + 1]] <- list(company = year_rows$company[i], year = year, column = column, score = z[i])
  }
  found
}

# Every window of consecutive years tried, the companies complete in it counted.
window <- function(rows, own = NULL) {
  best <- NULL
  years <- min(rows$year):max(rows$year)
  complete <- rows[complete.cases(rows[columns]), ]
  for (first in years) for (last in years[years >= first + 5]) {
    inside <- complete[complete$year >= first & complete$year <= last, ]
    counts <- table(inside$company)
    names <- names(counts)[counts == last - first + 1]
    if (length(names) < 2 || (!is.null(own) && !(own %in% names))) next
    size <- c(length(names) * (last - first + 1), last - first + 1, last)
    if (is.null(best) || size[1] > best$size[1] ||
        (size[1] == best$size[1] && (size[2] > best$size[2] || (size[2] == best$size[2] && size[3] > best$size[3]))))
      best <- list(size = size, firstYear = first, lastYear = last, companies = sort(names))
  }
  best[-1]
}

# Every row held against every other row of its year: equal in all model figures that both have, two at least not 0.
duplicates <- function(rows) {
  found <- list()
  for (i in seq_len(nrow(rows))) {
    mine <- unlist(rows[i, columns])
    others <- character(0)
    same <- character(0)
    for (j in which(rows$year == rows$year[i] & rows$company != rows$company[i])) {
      theirs <- unlist(rows[j, columns])
      both <- !is.na(mine) & !is.na(theirs)
      if (sum(both & mine != 0, na.rm = TRUE) < 2 || any(mine[both] != theirs[both])) next
      others <- c(others, rows$company[j])
      if (sum(both) > length(same)) same <- columns[both]
    }
    if (length(others) > 0)
      found[[length(found) + 1]] <- list(company = rows$company[i], year = rows$year[i], other = min(others),
                                         more = length(others) - 1, columns = I(same))
  }
  found
}

# Names equal without case, punctuation, legal forms and the order of words, or at most 15 % of the longer one's letters
# apart (five letters or more, the same digits), by utils::adist; with years that overlap or adjoin.
legal <- c("ag", "co", "corp", "gmbh", "inc", "kg", "limited", "ltd", "nv", "plc", "sa", "se")
bare <- function(name) {
  words <- strsplit(gsub("[.']", "", tolower(name)), "[^a-z0-9]+")[[1]]
  words <- words[words != ""]
  paste(sort(if (all(words %in% legal)) words else setdiff(words, legal), method = "radix"), collapse = " ")
}
near_names <- function(spans) {
  found <- list()
  for (i in seq_len(nrow(spans) - 1)) for (j in (i + 1):nrow(spans)) {
    a <- bare(spans$company[i])
    b <- bare(spans$company[j])
    is_near <- min(nchar(c(a, b))) >= 5 && adist(a, b) <= floor(0.15 * max(nchar(c(a, b)))) &&
      gsub("[^0-9]", "", a) == gsub("[^0-9]", "", b)
    apart <- max(spans$first[c(i, j)]) - min(spans$last[c(i, j)])
    if ((a == b || is_near) && apart <= 1) found[[length(found) + 1]] <- spans$company[c(i, j)]
  }
  found
}

measures <- function(rows) do.call(rbind, lapply(unique(rows$company), function(name) {
  own <- rows[rows$company == name, ]
  own <- own[order(own$year), ]
  value <- own$marketValue
  changes <- diff(log(value))[diff(own$year) == 1]
  data.frame(company = name, logMarketValue = log(tail(value, 1)), logBookEquity = log(tail(own$bookEquity, 1)),
             capexToBookEquity = sum(own$capex) / sum(own$bookEquity),
             growth = log(tail(value, 1) / value[1]) / (tail(own$year, 1) - own$year[1]), volatility = sd(changes))
}))
by_mad <- function(x, y) covGK(x, y, scalefn = s_mad)
scatter_ogk <- function(points) covOGK(points, sigmamu = s_mad, rcov = by_mad)$cov

grunfeld <- panel("grunfeld11_value_on_inv_capital")
# Rows copied over another company's in the Grunfeld panel, whole and in part, and cells that are then emptied.
copied <- panel("grunfeld10")
copies <- list(list(year = 1937, from = "F01", to = "F05", columns = columns),
               list(year = 1937, from = "F01", to = "F08", columns = columns),
               list(year = 1941, from = "F03", to = "F02", columns = I(columns[c(1, 3)])),
               list(year = 1944, from = "F09", to = "F04", columns = columns),
               list(year = 1948, from = "F06", to = "F10", columns = I("capex")))
for (it in copies) copied[copied$company == it$to & copied$year == it$year, it$columns] <-
  copied[copied$company == it$from & copied$year == it$year, it$columns]
emptied <- list(list(company = "F02", year = 1941, column = "capex"),
                list(company = "F09", year = 1944, column = "bookEquity"))
for (it in emptied) copied[copied$company == it$company & copied$year == it$year, it$column] <- NA
spans <- data.frame(
  company = c("Nordwerk AG", "NORDWERK", "Tallow Reed plc", "Reed, Tallow", "Ostrova", "Ostrvoa Ltd.", "Brunnholm",
              "Brunnholn", "Kesdrin 1", "Kesdrin 2", "Velmara", "Velmara Inc.", "Arvo", "Arva"),
  first = c(2001, 2005, 2001, 2008, 2001, 2006, 2001, 2004, 2001, 2001, 2001, 2009, 2001, 2001),
  last = c(2004, 2009, 2009, 2009, 2005, 2009, 2009, 2006, 2009, 2009, 2007, 2010, 2009, 2009))

measured <- measures(grunfeld)
points <- as.matrix(measured[-1])
rownames(points) <- measured$company
own <- measured$company[4]
distances <- function(scatter) {
  found <- sort(sqrt(mahalanobis(points, points[own, ], scatter)))
  found <- found[names(found) != own]
  Map(function(name, distance) {
    away <- points[name, ] - points[own, ]
    list(company = name, distance = distance, parts = unname(away * solve(scatter, away)))
  }, names(found), unname(found)) |> unname()
}
stack <- as.matrix(stackloss)

results <- list(
  origin = paste("tools/reference/panel_data.R with", R.version.string, "and robustbase", packageVersion("robustbase")),
  jumps = list(grunfeld10 = jumps(panel("grunfeld10")), grunfeld11 = jumps(grunfeld)),
  peerOutliers = list(grunfeld10 = outliers(panel("grunfeld10")), grunfeld11 = outliers(grunfeld)),
  duplicates = list(copies = copies, emptied = emptied, found = duplicates(copied)),
  nearNames = list(spans = spans, pairs = near_names(spans)),
  windows = list(balanced = window(panel("grunfeld10")), unbalanced = window(panel("grunfeld10_unbalanced")),
                 unbalancedWithF07 = window(panel("grunfeld10_unbalanced"), "F07"),
                 unbalancedWithF02 = window(panel("grunfeld10_unbalanced"), "F02")),
  measures = measured,
  distances = list(own = own, classical = distances(cov(points)), robust = distances(scatter_ogk(points))),
  scatter = list(points = unname(stack), classical = unname(cov(stack)), robust = unname(scatter_ogk(stack)))
)
write(jsonlite::toJSON(results, auto_unbox = TRUE, digits = I(17), pretty = 2),
      "backend/panel-data/golden/panel-data.json")

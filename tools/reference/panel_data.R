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
  windows = list(balanced = window(panel("grunfeld10")), unbalanced = window(panel("grunfeld10_unbalanced")),
                 unbalancedWithF07 = window(panel("grunfeld10_unbalanced"), "F07"),
                 unbalancedWithF02 = window(panel("grunfeld10_unbalanced"), "F02")),
  measures = measured,
  distances = list(own = own, classical = distances(cov(points)), robust = distances(scatter_ogk(points))),
  scatter = list(points = unname(stack), classical = unname(cov(stack)), robust = unname(scatter_ogk(stack)))
)
write(jsonlite::toJSON(results, auto_unbox = TRUE, digits = I(17), pretty = 2),
      "backend/panel-data/golden/panel-data.json")

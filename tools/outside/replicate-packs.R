# Rscript tools/outside/replicate-packs.R RESULT.json FOLDER...: the replication script on many packs in one process.

root <- getwd()
source(file.path(root, "backend/fits/replication/replication.R"), encoding = "UTF-8")
arguments <- commandArgs(trailingOnly = TRUE)
largest <- lapply(arguments[-1], function(folder) {
  table <- replicate_fit(folder)
  table <- table[table$numbers > 0, ]
  worst <- which.max(table$difference)
  list(folder = basename(folder), figure = table$figure[worst], numbers = sum(table$numbers), difference = sprintf("%.17g", table$difference[worst]))
})
jsonlite::write_json(largest, arguments[1], auto_unbox = TRUE)

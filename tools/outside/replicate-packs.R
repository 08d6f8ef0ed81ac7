# Rscript tools/outside/replicate-packs.R RESULT.json FOLDER...: the replication script on many packs in one process.

root <- getwd()
source(file.path(root, "backend/fits/replication/replication.R"), encoding = "UTF-8")
arguments <- commandArgs(trailingOnly = TRUE)
largest <- lapply(arguments[-1], function(folder) {
  table <- replicate_fit(folder)
  table <- table[table$numbers > 0, ]
  worst <- which.max(table$difference)
  apart <- table$difference[worst]
  list(figure = table$figure[worst], difference = if (is.finite(apart)) sprintf("%.17g", apart) else "Infinity")
})
jsonlite::write_json(largest, arguments[1], auto_unbox = TRUE)

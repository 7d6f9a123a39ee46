"""A schedule of marks, one row each, becomes notebooks, PDFs, a workbook of results and a summary, by processes that stay warm."""

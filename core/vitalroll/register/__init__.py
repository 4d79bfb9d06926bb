"""A spreadsheet becomes a cohort, and every row set aside is named with its line."""

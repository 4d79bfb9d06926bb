"""Fair comparison of groups: tables, strata, rank tests, regression."""

"""What became of the patients. Every method here reads one table: ``risk_table.RiskTable``."""

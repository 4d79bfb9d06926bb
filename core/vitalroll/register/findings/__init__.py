"""What may be wrong in a register, found row by row, each with the repair that could be made of it."""

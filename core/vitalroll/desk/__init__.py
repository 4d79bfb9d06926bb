"""The one door: a task by name, plain data in, plain data out."""

from vitalroll.desk.door import Desk, answer

__all__ = ["Desk", "answer"]

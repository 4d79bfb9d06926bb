"""Vitalroll: what became of the patients on a follow-up register, and how many will be under care.

The engine of the Vitalroll page, usable on its own. It reads registers, describes
outcomes, compares groups and projects caseloads. It opens no file, no socket and no
clock: everything it needs is handed to it, and everything it says is codes and numbers.

Rooms, in the order data flows; each imports only from those before it:
``errors`` and ``numbers``, ``register``, ``outcomes``, ``comparison``, ``caseload``, ``desk``.
"""

__version__ = "0.1.0"

"""The coming years: who comes, who stays, what that takes."""

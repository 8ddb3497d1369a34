"""The version of dropkit; pyproject.toml states the same, and a test compares them."""

__all__ = ["VERSION"]

VERSION = "0.1.0"

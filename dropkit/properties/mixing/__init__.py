"""Composition rules: how the properties of a mixture follow from those of its liquids."""

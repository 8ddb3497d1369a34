"""Properties of liquids, mixtures, users' fluids and humid air, each with what it rests on."""

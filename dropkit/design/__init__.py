"""Tools that compose properties, numbers and models into designs; the first comes with the jets."""

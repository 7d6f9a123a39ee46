"""Published tables as data, one loader per subject; what each figure rests on stands in SOURCES.md."""

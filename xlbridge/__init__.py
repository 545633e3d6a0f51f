"""The bridge from the engine to spreadsheets: catalogue, adapter, front ends, audit, command."""

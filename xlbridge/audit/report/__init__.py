"""The reports of an audit: pure functions from its outcome to text."""

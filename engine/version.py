"""The release number: read by the package metadata, the command and the workbooks."""

__version__ = "0.1.0"

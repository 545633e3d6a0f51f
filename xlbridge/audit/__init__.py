"""Prove a workbook: by routes that share no code above the rules themselves."""

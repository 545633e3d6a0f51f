"""Run a Basic module in a headless LibreOffice: ``python basic_driver.py PROGRAM SUPPORT_FOLDER``.

Takes ``{"module": text, "calls": [[function, argument ...] ...]}`` on standard input and prints the results
as a JSON list. Runs in the Python that has LibreOffice's bridge.
"""

import json
import sys
import tempfile


def main():
    program, support = sys.argv[1:]
    sys.dont_write_bytecode = True
    sys.path.insert(0, support)
    from office_driver import Office, properties

    job = json.load(sys.stdin)
    with (
        tempfile.TemporaryDirectory(prefix="storyledger-office-") as folder,
        Office(program, None, folder) as office,
    ):
        options = properties(Hidden=True, MacroExecutionMode=4)
        book = office.desktop.loadComponentFromURL("private:factory/scalc", "_blank", 0, options)
        libraries = book.BasicLibraries
        libraries.VBACompatibilityMode = True
        if not libraries.hasByName("Standard"):
            libraries.createLibrary("Standard")
        libraries.getByName("Standard").insertByName("Module1", job["module"])
        print(json.dumps([call(book, *each) for each in job["calls"]]), flush=True)


def call(book, function, *arguments):
    address = f"vnd.sun.star.script:Standard.Module1.{function}?language=Basic&location=document"
    script = book.ScriptProvider.getScript(address)
    given = tuple(tuple(each) if isinstance(each, list) else each for each in arguments)
    return script.invoke(given, (), ())[0]


if __name__ == "__main__":
    main()

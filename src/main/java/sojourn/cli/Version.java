package sojourn.cli;

import picocli.CommandLine.IVersionProvider;
import sojourn.archive.ProgramVersion;

/** Tells the version that was built. */
final class Version implements IVersionProvider {
    @Override
    public String[] getVersion() {
        return new String[] {"sojourn " + ProgramVersion.current()};
    }
}

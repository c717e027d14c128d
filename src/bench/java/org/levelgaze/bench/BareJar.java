package org.levelgaze.bench;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Enumeration;
import java.util.Objects;
import java.util.regex.Pattern;
import java.util.zip.ZipEntry;
import java.util.zip.ZipFile;
import java.util.zip.ZipOutputStream;

/**
 * {@link BareApplication} packed as the program is: Spring Boot's loader and, taken from the program's own jar, the libraries
 * that {@code spring-boot-starter-webmvc} and {@code spring-boot-starter-thymeleaf} bring, and no others.
 */
final class BareJar {

    private static final String LIBRARIES = "BOOT-INF/lib/";
    private static final String CLASSES = "BOOT-INF/classes/";
    private static final String LOADER = "org/springframework/boot/loader/";
    private static final String SERVICES = "META-INF/services/";
    private static final Pattern NEEDED = Pattern.compile("(spring-boot(-autoconfigure|-webmvc|-servlet|-http-converter"
            + "|-jackson|-tomcat|-web-server|-thymeleaf)?"
            + "|spring-(core|beans|context|aop|expression|web|webmvc)|commons-logging|jspecify|micrometer-commons"
            + "|micrometer-observation|slf4j-api|logback-classic|logback-core|jul-to-slf4j|log4j-api|log4j-to-slf4j"
            + "|snakeyaml|jakarta\\.annotation-api|tomcat-embed-core|tomcat-embed-el|tomcat-embed-websocket|thymeleaf"
            + "|thymeleaf-spring6|attoparser|unbescape|jackson-annotations|jackson-core-3|jackson-databind-3)"
            + "[-.][0-9].*\\.jar");
    private static final String MANIFEST = """
            Manifest-Version: 1.0
            Main-Class: org.springframework.boot.loader.launch.JarLauncher
            Start-Class: org.levelgaze.bench.BareApplication
            Spring-Boot-Classes: BOOT-INF/classes/
            Spring-Boot-Lib: BOOT-INF/lib/
            """;

    private BareJar() {}

    /** Writes the jar. */
    static void write(Path program, Path bare) throws IOException {
        try (ZipFile from = new ZipFile(program.toFile());
                ZipOutputStream to = new ZipOutputStream(Files.newOutputStream(bare))) {
            to.putNextEntry(new ZipEntry("META-INF/MANIFEST.MF"));
            to.write(MANIFEST.getBytes(StandardCharsets.UTF_8));
            Enumeration<? extends ZipEntry> entries = from.entries();
            while (entries.hasMoreElements()) {
                ZipEntry entry = entries.nextElement();
                if (!entry.isDirectory() && needed(entry.getName())) {
                    copy(from, entry, to);
                }
            }
            to.putNextEntry(new ZipEntry(CLASSES));
            own(to, "org/levelgaze/bench/BareApplication.class");
            own(to, "templates/bench/bare.html");
        }
    }

    private static boolean needed(String name) {
        return name.startsWith(LOADER)
                || name.startsWith(SERVICES)
                || (name.startsWith(LIBRARIES)
                        && NEEDED.matcher(name.substring(LIBRARIES.length())).matches());
    }

    /** Libraries stay uncompressed, as the loader wants them. */
    private static void copy(ZipFile from, ZipEntry entry, ZipOutputStream to) throws IOException {
        ZipEntry copied = new ZipEntry(entry.getName());
        if (entry.getMethod() == ZipEntry.STORED) {
            copied.setMethod(ZipEntry.STORED);
            copied.setSize(entry.getSize());
            copied.setCrc(entry.getCrc());
        }
        to.putNextEntry(copied);
        try (InputStream content = from.getInputStream(entry)) {
            content.transferTo(to);
        }
    }

    private static void own(ZipOutputStream to, String resource) throws IOException {
        to.putNextEntry(new ZipEntry(CLASSES + resource));
        try (InputStream content = Objects.requireNonNull(BareJar.class.getResourceAsStream("/" + resource))) {
            content.transferTo(to);
        }
    }
}
